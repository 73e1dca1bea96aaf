import { Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from 'sequelize';

/** A reviewer's yes to one exact text on one base. It counts while both are still those of the revision. */
export class Agreement extends Model<InferAttributes<Agreement>, InferCreationAttributes<Agreement>> {
  declare id: CreationOptional<string>;
  declare revisionId: string;
  declare personId: string;
  declare hash: string;
  /** Letter of the revision the text was compared with; null for a new procedure. */
  declare base: CreationOptional<string | null>;
  declare at: string;
  declare createdAt: CreationOptional<string>;
  declare updatedAt: CreationOptional<string>;
}

/** The written reason of a return or a decline. */
export class Remark extends Model<InferAttributes<Remark>, InferCreationAttributes<Remark>> {
  declare id: CreationOptional<string>;
  declare revisionId: string;
  declare personId: string;
  declare kind: 'returned' | 'declined';
  declare text: string;
  /** `step:<id>`, the path of a value, or null for the whole text. */
  declare anchor: CreationOptional<string | null>;
  declare at: string;
  declare createdAt: CreationOptional<string>;
  declare updatedAt: CreationOptional<string>;
}
