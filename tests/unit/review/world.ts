import fc from 'fast-check';
import type { Book, Membership } from '@/domain/people/may';
import type { ProposalAct } from '@/domain/review/decide';

/** A made-up network, and what its people do to one proposal. */

export const PEOPLE = ['a', 'b', 'c', 'd', 'e'];
export const SHOPS = ['pier', 'north'] as const;
/** Torques of every text; which of them are past proof load is drawn. */
export const TORQUES = ['head', 'rod'] as const;
export type TorqueKey = (typeof TORQUES)[number];

type ShopRole = Extract<Membership, { in: 'shop' }>['role'];
export type Hold = `${(typeof SHOPS)[number]} ${ShopRole}` | 'common editor' | 'steward';

/** What a text says, as far as review goes by it. */
export interface Drawn {
  text: number;
  critical: boolean;
  over: TorqueKey[];
}
export type Event =
  | ({ do: ProposalAct['act']; who: number; words: boolean; torque: TorqueKey } & Drawn)
  | { do: 'role'; who: number; hold: Hold | null }
  /** Somebody else's text is published, in which these torques are past proof load already. */
  | { do: 'another revision'; over: TorqueKey[] }
  | { do: 'rebase'; who: number };

const ROLES: ShopRole[] = ['apprentice', 'technician', 'senior', 'editor', 'editor', 'owner'];
const shopHolds = SHOPS.flatMap((shop) => ROLES.map((role): Hold => `${shop} ${role}`));
const hold = fc.constantFrom<Hold[]>(...shopHolds, 'common editor', 'common editor', 'common editor', 'steward');
const who = fc.nat(PEOPLE.length - 1);
const over = fc.oneof(
  { weight: 2, arbitrary: fc.constant<TorqueKey[]>([]) },
  { weight: 3, arbitrary: fc.subarray([...TORQUES], { minLength: 1 }) },
);
const ACTS: ProposalAct['act'][] = [
  'edit',
  'submit',
  'submit',
  'return',
  'decline',
  'agree',
  'agree',
  'override',
  'override',
  'override',
  'publish',
  'publish',
];
const act = fc.record({
  do: fc.constantFrom<ProposalAct['act'][]>(...ACTS),
  who,
  words: fc.boolean(),
  torque: fc.constantFrom(...TORQUES),
  text: fc.nat(2),
  critical: fc.boolean(),
  over,
});
const event: fc.Arbitrary<Event> = fc.oneof(
  { weight: 24, arbitrary: act },
  {
    weight: 2,
    arbitrary: fc.record({ do: fc.constant('role' as const), who, hold: fc.option(hold, { freq: 4 }) }),
  },
  { weight: 1, arbitrary: fc.record({ do: fc.constant('another revision' as const), over }) },
  { weight: 1, arbitrary: fc.record({ do: fc.constant('rebase' as const), who }) },
);

const bookEditor = 'editor of the book';
export const world = fc.record({
  book: fc.constantFrom<Book[]>(
    { kind: 'common' },
    { kind: 'common' },
    { kind: 'shop', shopId: 'pier' },
    { kind: 'shop', shopId: 'north' },
  ),
  author: who,
  start: fc.record({ text: fc.nat(2), critical: fc.boolean(), over }),
  baseOver: over,
  /** What each person holds, up to two roles; without enough editors of the book few sequences get anywhere. */
  holds: fc.array(
    fc.array(fc.oneof({ weight: 3, arbitrary: fc.constant(bookEditor) }, { weight: 2, arbitrary: hold }), {
      minLength: 1,
      maxLength: 2,
    }),
    { minLength: PEOPLE.length, maxLength: PEOPLE.length },
  ),
  events: fc.array(event, { minLength: 15, maxLength: 70 }),
});
export type World = typeof world extends fc.Arbitrary<infer T> ? T : never;

export const bookEditorOf = (book: Book): Hold =>
  book.kind === 'common' ? 'common editor' : (`${book.shopId} editor` as Hold);
export const holdsOf = ({ holds, book }: World): Hold[][] =>
  holds.map((own) => own.map((h) => (h === bookEditor ? bookEditorOf(book) : (h as Hold))));

export function membership(held: Hold): Membership {
  if (held === 'common editor') return { in: 'common', role: 'editor' };
  if (held === 'steward') return { in: 'network', role: 'steward' };
  const [shopId = '', role] = held.split(' ');
  return { in: 'shop', shopId, role: role as ShopRole };
}
