import { Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from 'sequelize';
import type { SKILLS, System } from '@/domain/procedure/schema';
import type { FailingTorque } from '@/domain/revision/failingTorques';
import type { RevisionState, Severity, TakenBackFrom } from '@/domain/revision/types';

/** What lists show of a revision, so that they need not read its text. */
export interface RevisionHead {
  title: string;
  summary: string;
  system: System;
  engines: string[];
  minutes: number;
  skill: (typeof SKILLS)[number];
  /** The sheet itself is marked critical in its front matter. */
  critical: boolean;
  /** Hold points on the sheet. */
  holds: number;
}

export class Procedure extends Model<InferAttributes<Procedure>, InferCreationAttributes<Procedure>> {
  declare id: CreationOptional<string>;
  /** `P-0142`; never changes. */
  declare number: string;
  declare bookKind: 'common' | 'shop';
  /** Set for a shop book only. */
  declare shopId: CreationOptional<string | null>;
  /** The published revision; null until the first one is published. */
  declare currentRevisionId: CreationOptional<string | null>;
  declare withdrawnAt: CreationOptional<string | null>;
  declare createdAt: CreationOptional<string>;
  declare updatedAt: CreationOptional<string>;
}

/** One text of a procedure. Once published, only its state changes, to superseded; the database holds that. */
export class Revision extends Model<InferAttributes<Revision>, InferCreationAttributes<Revision>> {
  declare id: CreationOptional<string>;
  declare procedureId: string;
  /** Set when published, never before. */
  declare letter: CreationOptional<string | null>;
  declare state: RevisionState;
  /** The revision this text was made from; null for the first one. */
  declare parentId: CreationOptional<string | null>;
  declare source: string;
  /** SHA-256 of `source`, hex. */
  declare hash: string;
  /** Null while the text of a draft cannot be read. */
  declare head: CreationOptional<RevisionHead | null>;
  declare authorId: string;
  declare reason: CreationOptional<string>;
  /** The change, compared with its parent, needs two editors. Kept right by whoever saves the text. */
  declare critical: CreationOptional<boolean>;
  declare criticalReasons: CreationOptional<string[]>;
  /** What of earlier revisions the text sets back, latest first. Kept right like `critical`. */
  declare takesBack: CreationOptional<TakenBackFrom[]>;
  /** Its torques that fail the clamp check, kept right like `critical`; null where that was never judged. */
  declare failingTorques: CreationOptional<FailingTorque[] | null>;
  /** How grave the change is, and why. Kept right like `critical`; null where it was never weighed so. */
  declare severity: CreationOptional<Severity | null>;
  /** Rises with every change of text, reason, base or state; a writer names the one it read. */
  declare version: CreationOptional<number>;
  /** True from the first submission on; such a revision is never deleted. */
  declare everProposed: CreationOptional<boolean>;
  declare proposedAt: CreationOptional<string | null>;
  declare publishedAt: CreationOptional<string | null>;
  declare createdAt: CreationOptional<string>;
  declare updatedAt: CreationOptional<string>;
}

/** The HTML and the references made from a text, kept under the hash of that text. */
export class Rendering extends Model<InferAttributes<Rendering>, InferCreationAttributes<Rendering>> {
  declare hash: string;
  /** Which form of rendering made it; an older one is made again. */
  declare form: number;
  /** `RenderedProcedure` as JSON text. */
  declare json: string;
  declare createdAt: CreationOptional<string>;
  declare updatedAt: CreationOptional<string>;
}

/** What the search knows of a current revision; its body words stand in the table `searchWords`. */
export class SearchDocument extends Model<InferAttributes<SearchDocument>, InferCreationAttributes<SearchDocument>> {
  declare procedureId: string;
  /** "common" or the id of the shop whose book it is in. */
  declare book: string;
  /** Hash of the revision it was made from. */
  declare hash: string;
  declare json: string;
  declare createdAt: CreationOptional<string>;
  declare updatedAt: CreationOptional<string>;
}
