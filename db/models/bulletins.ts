import { Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from 'sequelize';
import type { BulletinKind } from '@/domain/bulletins/bulletin';

/** A notice to every reader of a book. Written with its cause, never changed; the database holds that. */
export class Bulletin extends Model<InferAttributes<Bulletin>, InferCreationAttributes<Bulletin>> {
  declare id: CreationOptional<string>;
  declare kind: BulletinKind;
  declare procedureId: string;
  /** The revision that was published then; of a critical change the one that brought it. */
  declare revisionId: string;
  /** Of a shop's own book; null for the common one. */
  declare shopId: CreationOptional<string | null>;
  /** Whole sentences: what changed, or the reason of a withdrawal. */
  declare words: string[];
  /** Who withdrew, brought back or published. */
  declare byId: string;
  declare at: string;
  declare createdAt: CreationOptional<string>;
  declare updatedAt: CreationOptional<string>;
}

/** A person has read a bulletin. Once, never changed. */
export class ReadAndSign extends Model<InferAttributes<ReadAndSign>, InferCreationAttributes<ReadAndSign>> {
  declare id: CreationOptional<string>;
  declare personId: string;
  declare bulletinId: string;
  declare at: string;
  declare createdAt: CreationOptional<string>;
  declare updatedAt: CreationOptional<string>;
}
