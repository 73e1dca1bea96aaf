/** The only place that knows what a role may do. The server guards with it and the page hides with it. */

export const ROLES = ['apprentice', 'technician', 'senior', 'editor', 'owner', 'steward'] as const;
export type Role = (typeof ROLES)[number];

/** A book belongs to the whole network or to one shop. */
export type Book = { kind: 'common' } | { kind: 'shop'; shopId: string };

/** A role held in a shop, as editor of the common book, or as steward of the network. */
export type Membership =
  | { in: 'shop'; shopId: string; role: Exclude<Role, 'steward'> }
  | { in: 'common'; role: 'editor' }
  | { in: 'network'; role: 'steward' };

export interface Actor {
  personId: string;
  memberships: readonly Membership[];
}

/** What a proposal must tell so that it can be said who may touch it. */
export interface ProposalSubject {
  book: Book;
  authorId: string;
  /** True once it was sent in for review, also after it went back to its author. */
  everProposed: boolean;
  critical: boolean;
  /** How many people hold the role of editor for its book (in a shop book, in that shop). */
  editors: number;
}

/** What each act is done to. */
export interface Subjects {
  readBook: { book: Book };
  propose: { book: Book };
  /** Starting a new procedure of a book from a sheet of another or the same one. */
  copySheet: { from: Book; to: Book };
  readProposal: ProposalSubject;
  editProposal: ProposalSubject;
  submit: ProposalSubject;
  return: ProposalSubject;
  decline: ProposalSubject;
  agree: ProposalSubject;
  /** Of a failed clamp check. */
  override: ProposalSubject;
  publish: ProposalSubject;
  withdraw: { book: Book };
  bringBack: { book: Book };
  /** Shops with exactly one editor, where a senior technician or the owner gives the second agreement. */
  seeReviewDesk: { shopsWithOneEditor: readonly string[] };
  readAudit: null;
  /** The entries of one shop. */
  readShopAudit: { shopId: string };
  flag: { book: Book };
  /** `raiserShops`: shops of the person who raised it; in a shop's own book they do not matter. */
  answerFlag: { book: Book; raisedBy: string; raiserShops: readonly string[] };
  addPhoto: null;
  /** One that was sent with something in that book. */
  removePhoto: { book: Book };
  runJobCard: { shopId: string; book: Book };
  signStep: { shopId: string };
  witness: { shopId: string; signedBy: string };
  writeSupplement: { shopId: string };
  manageMembers: { shopId: string };
  readShopSettings: { shopId: string };
  changeShopSettings: { shopId: string };
  manageShops: null;
}
export type Act = keyof Subjects;

/** `visible: false` answers 404, so that nobody learns that the thing exists; `visible: true` answers 403. */
export type Permission = { ok: true } | { ok: false; why: string; visible: boolean };

const YES: Permission = { ok: true };
const no = (why: string): Permission => ({ ok: false, why, visible: true });
const HIDDEN: Permission = {
  ok: false,
  why: 'There is no such thing here, or it is not yours to see.',
  visible: false,
};

type ShopRole = Exclude<Role, 'steward'>;
const WRITERS: readonly ShopRole[] = ['technician', 'senior', 'editor', 'owner'];
const SENIORS: readonly ShopRole[] = ['senior', 'editor', 'owner'];

const rolesIn = (actor: Actor, shopId: string) =>
  actor.memberships.flatMap((m) => (m.in === 'shop' && m.shopId === shopId ? [m.role] : []));
const holds = (actor: Actor, shopId: string, roles: readonly ShopRole[]) =>
  rolesIn(actor, shopId).some((role) => roles.includes(role));
const isMember = (actor: Actor, shopId: string) => rolesIn(actor, shopId).length > 0;
const isSteward = (actor: Actor) => actor.memberships.some((m) => m.in === 'network');
const editsCommon = (actor: Actor) => actor.memberships.some((m) => m.in === 'common');

const reads = (actor: Actor, book: Book) =>
  book.kind === 'common' ? actor.memberships.length > 0 : isMember(actor, book.shopId);
const edits = (actor: Actor, book: Book) =>
  book.kind === 'common' ? editsCommon(actor) : holds(actor, book.shopId, ['editor']);
const writes = (actor: Actor, book: Book) =>
  book.kind === 'shop'
    ? holds(actor, book.shopId, WRITERS)
    : editsCommon(actor) || actor.memberships.some((m) => m.in === 'shop' && WRITERS.includes(m.role));

/** May this person give the second agreement where the shop has one editor only? It never counts for the first. */
export const standsIn = (actor: Actor, p: Pick<ProposalSubject, 'book' | 'critical' | 'editors'>) =>
  p.book.kind === 'shop' && p.critical && p.editors === 1 && holds(actor, p.book.shopId, ['senior', 'owner']);

const readsProposal = (actor: Actor, p: ProposalSubject) =>
  reads(actor, p.book) && (p.everProposed || p.authorId === actor.personId);

function asAuthor(actor: Actor, p: ProposalSubject): Permission {
  if (!readsProposal(actor, p)) return HIDDEN;
  if (p.authorId !== actor.personId) return no('Only the author changes a proposal and sends it in.');
  return writes(actor, p.book) ? YES : no('You no longer hold a role that may propose a change to this book.');
}

function asReviewer(actor: Actor, p: ProposalSubject, doing: string, secondAgreement = false): Permission {
  if (!readsProposal(actor, p)) return HIDDEN;
  if (p.authorId === actor.personId) return no(`You wrote this proposal. Nobody ${doing} their own.`);
  if (edits(actor, p.book) || (secondAgreement && standsIn(actor, p))) return YES;
  const who = p.book.kind === 'common' ? 'an editor of the common book' : "this shop's editor";
  return no(`Only ${who} ${doing} a proposal.`);
}

/** Withdrawing takes the book's word back, and bringing back gives it again: both are for those who publish. */
function asEditor(actor: Actor, book: Book, doing: string): Permission {
  if (!reads(actor, book)) return HIDDEN;
  const who = book.kind === 'common' ? 'An editor of the common book' : "This shop's editor";
  return edits(actor, book) ? YES : no(`${who} ${doing}. Flag what is wrong with it.`);
}

/** In a shop: hidden from others, refused to members without the role. */
function inShop(actor: Actor, shopId: string, roles: readonly ShopRole[], why: string): Permission {
  if (!isMember(actor, shopId)) return HIDDEN;
  return holds(actor, shopId, roles) ? YES : no(why);
}

const RULES: { [A in Act]: (actor: Actor, subject: Subjects[A]) => Permission } = {
  readBook: (actor, { book }) => (reads(actor, book) ? YES : HIDDEN),
  propose: (actor, { book }) => {
    if (!reads(actor, book)) return HIDDEN;
    return writes(actor, book) ? YES : no('A technician, senior technician, editor or owner proposes a change.');
  },
  // A shop's own text goes where its shop wants it, and never to another shop that one of its people works in too.
  copySheet: (actor, { from, to }) => {
    if (!reads(actor, from) || !reads(actor, to)) return HIDDEN;
    if (!writes(actor, to)) return no('A technician, senior technician, editor or owner writes a new procedure.');
    if (from.kind === 'common') return YES;
    if (to.kind === 'shop')
      return from.shopId === to.shopId ? YES : no("A shop's own sheet is not copied into another shop's book.");
    return holds(actor, from.shopId, ['editor', 'owner'])
      ? YES
      : no("A shop's own sheet is copied into the common book, where every shop reads it, by its editor or owner.");
  },
  readProposal: (actor, p) => (readsProposal(actor, p) ? YES : HIDDEN),
  editProposal: asAuthor,
  submit: asAuthor,
  return: (actor, p) => asReviewer(actor, p, 'returns'),
  decline: (actor, p) => asReviewer(actor, p, 'declines'),
  agree: (actor, p) => asReviewer(actor, p, 'agrees to', true),
  override: (actor, p) => asReviewer(actor, p, 'overrides the clamp check of'),
  publish: (actor, p) => asReviewer(actor, p, 'publishes'),
  withdraw: (actor, { book }) => asEditor(actor, book, 'withdraws a sheet'),
  bringBack: (actor, { book }) => asEditor(actor, book, 'brings a withdrawn sheet back'),
  seeReviewDesk: (actor, { shopsWithOneEditor }) =>
    actor.memberships.some(
      (m) =>
        m.role === 'editor' ||
        (m.in === 'shop' && ['senior', 'owner'].includes(m.role) && shopsWithOneEditor.includes(m.shopId)),
    )
      ? YES
      : no('The review desk is for editors, who answer for what is published.'),
  readAudit: (actor) => (isSteward(actor) ? YES : no('The audit trail is for the network steward.')),
  readShopAudit: (actor, { shopId }) =>
    isSteward(actor)
      ? YES
      : inShop(actor, shopId, ['owner'], 'The audit trail of a shop is for its owner and the network steward.'),
  flag: (actor, { book }) => (reads(actor, book) ? YES : HIDDEN),
  // A flag on a common sheet is seen by the seniors of the shop where it was raised and by the book's editors, not by other shops.
  answerFlag: (actor, { book, raisedBy, raiserShops }) => {
    if (!reads(actor, book)) return HIDDEN;
    const shops = book.kind === 'shop' ? [book.shopId] : raiserShops;
    if (!edits(actor, book) && !shops.some((shopId) => holds(actor, shopId, SENIORS)))
      return raisedBy === actor.personId ? no('A senior technician, editor or owner answers a flag.') : HIDDEN;
    return raisedBy === actor.personId ? no('You raised this flag, so somebody else must answer it.') : YES;
  },
  addPhoto: (actor) =>
    actor.memberships.length > 0 ? YES : no('Photos are for people who work in a shop of the network.'),
  removePhoto: (actor, { book }) => {
    if (!reads(actor, book)) return HIDDEN;
    const who = book.kind === 'common' ? 'an editor of the common book' : "this shop's editor";
    return edits(actor, book) ? YES : no(`Only ${who} removes a photo of somebody else.`);
  },
  runJobCard: (actor, { shopId, book }) => (isMember(actor, shopId) && reads(actor, book) ? YES : HIDDEN),
  signStep: (actor, { shopId }) => (isMember(actor, shopId) ? YES : HIDDEN),
  // 14 CFR 121.371(c): nobody inspects the work that they did themselves.
  witness: (actor, { shopId, signedBy }) => {
    const may = inShop(actor, shopId, SENIORS, 'A senior technician, editor or owner witnesses a hold point.');
    return may.ok && signedBy === actor.personId ? no('You signed this step, so somebody else must witness it.') : may;
  },
  writeSupplement: (actor, { shopId }) =>
    inShop(actor, shopId, SENIORS, 'A senior technician, editor or owner writes a supplement.'),
  manageMembers: (actor, { shopId }) =>
    isSteward(actor)
      ? YES
      : inShop(actor, shopId, ['owner'], 'The owner of the shop or the network steward looks after its people.'),
  readShopSettings: (actor, { shopId }) => (isSteward(actor) || isMember(actor, shopId) ? YES : HIDDEN),
  changeShopSettings: (actor, { shopId }) =>
    isSteward(actor)
      ? YES
      : inShop(actor, shopId, ['owner'], 'The owner of the shop or the network steward changes its settings.'),
  manageShops: (actor) =>
    isSteward(actor) ? YES : no('The network steward looks after shops and common-book editors.'),
};

/** May this person do this to that? The answer to a refusal is a sentence for the person who was refused. */
export function may<A extends Act>(actor: Actor, act: A, subject: Subjects[A]): Permission {
  return RULES[act](actor, subject);
}
