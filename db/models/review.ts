import { Model, type CreationOptional, type InferAttributes, type InferCreationAttributes } from 'sequelize';
import type { Suggestion } from '@/domain/review/suggestions';
import type { ThreadKind } from '@/domain/review/threads';
import type { Origin } from '@/domain/api/schemas/imports';
import type { VersionKind } from '@/domain/writing/versions';

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

/** An editor's written reason why one torque of one exact text stays although it fails the clamp check. */
export class ClampOverride extends Model<InferAttributes<ClampOverride>, InferCreationAttributes<ClampOverride>> {
  declare id: CreationOptional<string>;
  declare revisionId: string;
  declare hash: string;
  declare torqueKey: string;
  declare personId: string;
  declare reason: string;
  /** Clamp load over proof load, as it was judged: more than 1. */
  declare share: number;
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

/** A remark, a question or a suggestion on a proposed text. */
export class Thread extends Model<InferAttributes<Thread>, InferCreationAttributes<Thread>> {
  declare id: CreationOptional<string>;
  declare revisionId: string;
  declare personId: string;
  declare kind: ThreadKind;
  /** `step:<id>`, the path of a value, or null for the whole text. */
  declare anchor: string | null;
  /** What the anchor was called when it was written, for when it is gone. */
  declare place: string;
  declare suggestion: Suggestion | null;
  declare state: CreationOptional<'open' | 'resolved'>;
  /** How many messages stood when it was last opened. */
  declare openedAt: CreationOptional<number>;
  declare resolvedById: CreationOptional<string | null>;
  declare resolvedAt: CreationOptional<string | null>;
  declare acceptedAt: CreationOptional<string | null>;
  declare version: CreationOptional<number>;
  declare at: string;
  declare createdAt: CreationOptional<string>;
  declare updatedAt: CreationOptional<string>;
}

export class ThreadMessage extends Model<InferAttributes<ThreadMessage>, InferCreationAttributes<ThreadMessage>> {
  declare id: CreationOptional<string>;
  declare threadId: string;
  declare personId: string;
  declare text: string;
  /** Who is named in it as `@Name`. */
  declare mentions: CreationOptional<{ id: string; name: string }[]>;
  declare at: string;
  declare createdAt: CreationOptional<string>;
  declare updatedAt: CreationOptional<string>;
}

/** A doubt about a step, as somebody wrote it. */
export class Flag extends Model<InferAttributes<Flag>, InferCreationAttributes<Flag>> {
  declare id: CreationOptional<string>;
  declare procedureId: string;
  /** The revision that was on the screen. */
  declare revisionId: string;
  /** Null where it is about the whole sheet. */
  declare stepId: CreationOptional<string | null>;
  declare kind: 'wrong' | 'unclear' | 'missing';
  declare text: string;
  declare personId: string;
  declare state: 'open' | 'answered' | 'taken up' | 'withdrawn';
  declare endedById: CreationOptional<string | null>;
  declare endedAt: CreationOptional<string | null>;
  declare answer: CreationOptional<string>;
  /** The draft that was started from it. */
  declare proposalId: CreationOptional<string | null>;
  /** When the person who raised it saw how it ended. */
  declare seenAt: CreationOptional<string | null>;
  declare createdAt: CreationOptional<string>;
  declare updatedAt: CreationOptional<string>;
}

/** A draft as it stood once. Its text is packed against that of the first version. */
export class DraftVersion extends Model<InferAttributes<DraftVersion>, InferCreationAttributes<DraftVersion>> {
  declare id: CreationOptional<string>;
  declare revisionId: string;
  /** Rises by one from version to version, from 1. */
  declare n: number;
  declare kind: VersionKind;
  /** Of a `restore`, the number of the version that was gone back to. */
  declare ofN: CreationOptional<number | null>;
  declare personId: string;
  declare at: string;
  declare sittingAt: string;
  declare page: CreationOptional<string | null>;
  /** The revision that it stood on; null for a new procedure. */
  declare parentId: string | null;
  declare reason: string;
  /** SHA-256 of the text, hex. */
  declare hash: string;
  declare packed: Buffer;
  /** What differs from the version before it that is still kept, in words. */
  declare what: CreationOptional<string[]>;
  declare createdAt: CreationOptional<string>;
  declare updatedAt: CreationOptional<string>;
}

/** What a new procedure was begun from. Written with its first draft, never changed; it goes when the draft is thrown away. */
export class ProcedureOrigin extends Model<InferAttributes<ProcedureOrigin>, InferCreationAttributes<ProcedureOrigin>> {
  declare procedureId: string;
  declare json: Origin;
  declare createdAt: CreationOptional<string>;
  declare updatedAt: CreationOptional<string>;
}
