import type { Worked } from '../measure/worked';
import type { Fields, Values } from './fields';
import type { Outcome } from './outcome';

/** Texts as somebody types them into a form: a box each, two for a band (`clearance.min`), one for each place of a row (`injectors.0.before`). */
export type TypedIn = Readonly<Record<string, string>>;

/** A worksheet: a set of readings with a computation. One folder each, listed in `registry.ts`. */
export interface Worksheet<F extends Fields = Fields> {
  /** Name in addresses, the API and sheets: `injector-set`. */
  name: string;
  /** "Injector set". */
  title: string;
  /** One sentence that says what it answers. */
  summary: string;
  fields: F;
  /** Headings over the fields, in the order they are asked for. Each field stands in one. */
  groups: readonly { title: string; fields: readonly (keyof F & string)[] }[];
  /** A worked case that people can try, as they would type it. */
  example: TypedIn;
  /** Judges values in base units; refuses what cannot be, naming the field. Never throws, never answers NaN. */
  compute: (values: Values<F>) => Worked<Outcome>;
}

/** Ties fields, groups and computation together, so that the compiler checks one against the other. */
export const worksheet = <F extends Fields>(given: Worksheet<F>): Worksheet<F> => given;
