import { Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from 'sequelize';

/** One act, chained by hash to the one before it; `src/server/audit` writes and verifies them. */
export class AuditEntry extends Model<InferAttributes<AuditEntry>, InferCreationAttributes<AuditEntry>> {
  declare seq: CreationOptional<number>;
  declare at: string;
  /** Null where the system itself acted. */
  declare actorId: string | null;
  declare act: string;
  declare subjectType: string;
  declare subjectId: string;
  /** The shop it concerns; null for the common book and the network. */
  declare shopId: string | null;
  declare detail: Record<string, unknown>;
  /** Empty for the first entry. */
  declare previousHash: string;
  declare hash: string;
  declare createdAt: CreationOptional<string>;
  declare updatedAt: CreationOptional<string>;
}

export class Setting extends Model<InferAttributes<Setting>, InferCreationAttributes<Setting>> {
  declare key: string;
  declare value: string;
  declare createdAt: CreationOptional<string>;
  declare updatedAt: CreationOptional<string>;
}

/** The answer given to a changing call, so that the same call sent twice acts once. */
export class IdempotencyKey extends Model<InferAttributes<IdempotencyKey>, InferCreationAttributes<IdempotencyKey>> {
  declare personId: string;
  declare key: string;
  /** SHA-256 of method, path and body; another request under the same key is refused. */
  declare request: string;
  declare status: number;
  declare headers: CreationOptional<Record<string, string>>;
  declare body: string;
  declare createdAt: CreationOptional<string>;
  declare updatedAt: CreationOptional<string>;
}
