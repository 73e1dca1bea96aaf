import { DataTypes, type Sequelize } from 'sequelize';
import { Attachment } from './attachments';
import { Procedure, Rendering, Revision, SearchDocument } from './book';
import { Bulletin, ReadAndSign } from './bulletins';
import { flag, id, optionalText, text, times } from './columns';
import { FeedKey } from './feeds';
import { Membership, Person, Shop, ShopRule } from './people';
import { AuditEntry, IdempotencyKey, Setting } from './records';
import { Agreement, ClampOverride, DraftVersion, Flag, ProcedureOrigin, Remark, Thread, ThreadMessage } from './review';

const key = { ...text, primaryKey: true };
const integer = { type: DataTypes.INTEGER, allowNull: false };
const json = { type: DataTypes.JSON, allowNull: false };

/** Sequelize writes the name of the column into each description, so columns must not share one. */
const own = <T extends Record<string, object>>(columns: T): T =>
  Object.fromEntries(Object.entries(columns).map(([name, column]) => [name, { ...column }])) as T;

/**
 * Binds the models to one connection. Each call makes classes of its own, so that two open databases
 * (in tests) do not take them from each other. Rules and keys stand in the migrations.
 */
export function defineModels(sequelize: Sequelize, now: () => string) {
  const stamps = times(now);
  const bind = (modelName: string, tableName: string) => ({ sequelize, modelName, tableName, timestamps: false });

  sequelize.addHook('beforeUpdate', (row) => {
    if (!row.changed('updatedAt' as never)) row.set('updatedAt' as never, now() as never);
  });
  sequelize.addHook('beforeBulkUpdate', (options) => {
    const bulk = options as unknown as { attributes: Record<string, unknown>; fields: string[] };
    bulk.attributes['updatedAt'] ??= now();
    if (!bulk.fields.includes('updatedAt')) bulk.fields.push('updatedAt');
  });

  return {
    Shop: class extends Shop {}.init(own({ id, name: text, demonstration: flag, ...stamps }), bind('Shop', 'shops')),
    Person: class extends Person {}.init(
      own({
        id,
        kind: { ...text, defaultValue: 'person' },
        email: optionalText,
        name: text,
        passwordHash: optionalText,
        tokenVersion: { ...integer, defaultValue: 1 },
        units: { ...text, defaultValue: 'metric' },
        shortcuts: { ...flag, defaultValue: true },
        currentShopId: optionalText,
        demonstration: flag,
        ...stamps,
      }),
      bind('Person', 'people'),
    ),
    Membership: class extends Membership {}.init(
      own({ id, personId: text, scope: text, shopId: optionalText, role: text, ...stamps }),
      bind('Membership', 'memberships'),
    ),
    ShopRule: class extends ShopRule {}.init(
      own({
        id,
        shopId: text,
        name: text,
        value: { type: DataTypes.DOUBLE, allowNull: false },
        setById: text,
        ...stamps,
      }),
      bind('ShopRule', 'shopRules'),
    ),
    Procedure: class extends Procedure {}.init(
      own({
        id,
        number: text,
        bookKind: text,
        shopId: optionalText,
        currentRevisionId: optionalText,
        withdrawnAt: optionalText,
        ...stamps,
      }),
      bind('Procedure', 'procedures'),
    ),
    Revision: class extends Revision {}.init(
      own({
        id,
        procedureId: text,
        letter: optionalText,
        state: text,
        parentId: optionalText,
        source: text,
        hash: text,
        head: { type: DataTypes.JSON, allowNull: true },
        authorId: text,
        reason: { ...text, defaultValue: '' },
        critical: flag,
        criticalReasons: { ...json, defaultValue: [] },
        takesBack: { ...json, defaultValue: [] },
        failingTorques: { type: DataTypes.JSON, allowNull: true, defaultValue: [] },
        severity: { ...json, allowNull: true, defaultValue: null },
        version: { ...integer, defaultValue: 1 },
        everProposed: flag,
        proposedAt: optionalText,
        publishedAt: optionalText,
        ...stamps,
      }),
      bind('Revision', 'revisions'),
    ),
    ProcedureOrigin: class extends ProcedureOrigin {}.init(
      own({ procedureId: key, json, ...stamps }),
      bind('ProcedureOrigin', 'origins'),
    ),
    Rendering: class extends Rendering {}.init(
      own({ hash: key, form: integer, json: text, ...stamps }),
      bind('Rendering', 'renderings'),
    ),
    Agreement: class extends Agreement {}.init(
      own({ id, revisionId: text, personId: text, hash: text, base: optionalText, at: text, ...stamps }),
      bind('Agreement', 'agreements'),
    ),
    ClampOverride: class extends ClampOverride {}.init(
      own({
        id,
        revisionId: text,
        hash: text,
        torqueKey: text,
        personId: text,
        reason: text,
        share: { type: DataTypes.DOUBLE, allowNull: false },
        at: text,
        ...stamps,
      }),
      bind('ClampOverride', 'clampOverrides'),
    ),
    Remark: class extends Remark {}.init(
      own({ id, revisionId: text, personId: text, kind: text, text, anchor: optionalText, at: text, ...stamps }),
      bind('Remark', 'remarks'),
    ),
    Thread: class extends Thread {}.init(
      own({
        id,
        revisionId: text,
        personId: text,
        kind: text,
        anchor: optionalText,
        place: text,
        suggestion: { type: DataTypes.JSON, allowNull: true },
        state: { ...text, defaultValue: 'open' },
        openedAt: { ...integer, defaultValue: 1 },
        resolvedById: optionalText,
        resolvedAt: optionalText,
        acceptedAt: optionalText,
        version: { ...integer, defaultValue: 1 },
        at: text,
        ...stamps,
      }),
      bind('Thread', 'threads'),
    ),
    ThreadMessage: class extends ThreadMessage {}.init(
      own({ id, threadId: text, personId: text, text, mentions: { ...json, defaultValue: [] }, at: text, ...stamps }),
      bind('ThreadMessage', 'threadMessages'),
    ),
    DraftVersion: class extends DraftVersion {}.init(
      own({
        id,
        revisionId: text,
        n: integer,
        kind: text,
        ofN: { type: DataTypes.INTEGER, allowNull: true },
        personId: text,
        at: text,
        sittingAt: text,
        page: optionalText,
        parentId: optionalText,
        reason: text,
        hash: text,
        packed: { type: DataTypes.BLOB, allowNull: false },
        what: { ...json, defaultValue: [] },
        ...stamps,
      }),
      bind('DraftVersion', 'draftVersions'),
    ),
    Bulletin: class extends Bulletin {}.init(
      own({
        id,
        kind: text,
        procedureId: text,
        revisionId: text,
        shopId: optionalText,
        words: json,
        byId: text,
        at: text,
        ...stamps,
      }),
      bind('Bulletin', 'bulletins'),
    ),
    ReadAndSign: class extends ReadAndSign {}.init(
      own({ id, personId: text, bulletinId: text, at: text, ...stamps }),
      bind('ReadAndSign', 'readAndSigned'),
    ),
    Flag: class extends Flag {}.init(
      own({
        id,
        procedureId: text,
        revisionId: text,
        stepId: optionalText,
        kind: text,
        text,
        personId: text,
        state: text,
        endedById: optionalText,
        endedAt: optionalText,
        answer: { ...text, defaultValue: '' },
        proposalId: optionalText,
        seenAt: optionalText,
        ...stamps,
      }),
      bind('Flag', 'flags'),
    ),
    FeedKey: class extends FeedKey {}.init(
      own({ id, personId: text, shopId: optionalText, keyHash: optionalText, madeAt: text, ...stamps }),
      bind('FeedKey', 'feedKeys'),
    ),
    Attachment: class extends Attachment {}.init(
      own({
        id,
        uploaderId: text,
        subjectType: optionalText,
        subjectId: optionalText,
        place: { ...integer, defaultValue: 0 },
        alt: { ...text, defaultValue: '' },
        width: integer,
        height: integer,
        bytes: integer,
        hash: text,
        at: text,
        attachedAt: optionalText,
        removedById: optionalText,
        removedAt: optionalText,
        removedWhy: optionalText,
        ...stamps,
      }),
      bind('Attachment', 'attachments'),
    ),
    AuditEntry: class extends AuditEntry {}.init(
      own({
        seq: { type: DataTypes.INTEGER, primaryKey: true, autoIncrement: true },
        at: text,
        actorId: optionalText,
        act: text,
        subjectType: text,
        subjectId: text,
        shopId: optionalText,
        detail: json,
        previousHash: text,
        hash: text,
        ...stamps,
      }),
      bind('AuditEntry', 'auditEntries'),
    ),
    SearchDocument: class extends SearchDocument {}.init(
      own({ procedureId: key, book: text, hash: text, json: text, ...stamps }),
      bind('SearchDocument', 'searchDocuments'),
    ),
    Setting: class extends Setting {}.init(own({ key, value: text, ...stamps }), bind('Setting', 'settings')),
    IdempotencyKey: class extends IdempotencyKey {}.init(
      own({
        personId: key,
        key,
        request: text,
        status: integer,
        headers: { ...json, defaultValue: {} },
        body: text,
        ...stamps,
      }),
      bind('IdempotencyKey', 'idempotencyKeys'),
    ),
  };
}

export type Models = ReturnType<typeof defineModels>;
