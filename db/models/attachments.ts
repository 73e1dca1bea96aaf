import { Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from 'sequelize';
import type { PhotoSubject } from '@/domain/photos/photos';

/** A photo: uploaded, then sent with something. The picture lies in the file store under the id. */
export class Attachment extends Model<InferAttributes<Attachment>, InferCreationAttributes<Attachment>> {
  declare id: CreationOptional<string>;
  declare uploaderId: string;
  /** Null until it is sent. */
  declare subjectType: CreationOptional<PhotoSubject | null>;
  declare subjectId: CreationOptional<string | null>;
  /** Order among the photos of its subject, from 0; one that was taken off leaves a gap. */
  declare place: CreationOptional<number>;
  /** What it shows, in words. */
  declare alt: CreationOptional<string>;
  /** Pixels of the picture as it is kept, upright. */
  declare width: number;
  declare height: number;
  declare bytes: number;
  /** SHA-256 of the picture as it is kept, in hex. */
  declare hash: string;
  declare at: string;
  declare attachedAt: CreationOptional<string | null>;
  declare removedById: CreationOptional<string | null>;
  declare removedAt: CreationOptional<string | null>;
  declare removedWhy: CreationOptional<string | null>;
  declare createdAt: CreationOptional<string>;
  declare updatedAt: CreationOptional<string>;
}
