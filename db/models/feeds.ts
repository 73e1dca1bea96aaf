import { Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from 'sequelize';

/** The feed of one person on the common book and one shop's book. */
export class FeedKey extends Model<InferAttributes<FeedKey>, InferCreationAttributes<FeedKey>> {
  /** Names the feed, whatever its key is. */
  declare id: CreationOptional<string>;
  declare personId: string;
  /** Null for a feed of the common book alone. */
  declare shopId: string | null;
  /** SHA-256 of the key, hex; null where none opens it. */
  declare keyHash: string | null;
  /** When the key was made. */
  declare madeAt: string;
  declare createdAt: CreationOptional<string>;
  declare updatedAt: CreationOptional<string>;
}
