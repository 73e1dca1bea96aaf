import { Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from 'sequelize';
import type { Role } from '@/domain/people/may';

export class Shop extends Model<InferAttributes<Shop>, InferCreationAttributes<Shop>> {
  declare id: CreationOptional<string>;
  declare name: string;
  /** Part of the invented network that DEMO loads. */
  declare demonstration: CreationOptional<boolean>;
  declare createdAt: CreationOptional<string>;
  declare updatedAt: CreationOptional<string>;
}

export class Person extends Model<InferAttributes<Person>, InferCreationAttributes<Person>> {
  declare id: CreationOptional<string>;
  /** A `release` is the author of what came with the product; it never signs in. */
  declare kind: CreationOptional<'person' | 'release'>;
  /** Unique whatever its capitals; null for a release only. */
  declare email: string | null;
  declare name: string;
  /** argon2id in PHC form; null where nobody can sign in. */
  declare passwordHash: CreationOptional<string | null>;
  /** Stands in every session token; raising it ends all of them. */
  declare tokenVersion: CreationOptional<number>;
  declare units: CreationOptional<'metric' | 'inch'>;
  /** Single keys act as shortcuts. */
  declare shortcuts: CreationOptional<boolean>;
  /** The shop the person works in now. */
  declare currentShopId: CreationOptional<string | null>;
  declare demonstration: CreationOptional<boolean>;
  declare createdAt: CreationOptional<string>;
  declare updatedAt: CreationOptional<string>;
}

/** One role of one person. `scope` says where: in a shop, as editor of the common book, or for the network. */
export class Membership extends Model<InferAttributes<Membership>, InferCreationAttributes<Membership>> {
  declare id: CreationOptional<string>;
  declare personId: string;
  declare scope: 'shop' | 'common' | 'network';
  declare shopId: CreationOptional<string | null>;
  declare role: Role;
  declare createdAt: CreationOptional<string>;
  declare updatedAt: CreationOptional<string>;
}

/** What a shop has set for a rule of thumb. No row: the usual value stands. */
export class ShopRule extends Model<InferAttributes<ShopRule>, InferCreationAttributes<ShopRule>> {
  declare id: CreationOptional<string>;
  declare shopId: string;
  /** Worksheet and field: `injector-set.deviation`. */
  declare name: string;
  /** In the unit of the field. */
  declare value: number;
  declare setById: string;
  declare createdAt: CreationOptional<string>;
  /** When it was last set. */
  declare updatedAt: CreationOptional<string>;
}
