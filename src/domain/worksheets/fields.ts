import type { Unit } from '../measure/convert';

/**
 * What a worksheet asks for, described once: the form, the check of what was typed, the JSON Schema of the API, the
 * settings of a shop and the places that a sheet's limits fill are all made from these descriptions.
 */

interface Asked {
  /** Says what to enter: "Depth read". */
  label: string;
  hint?: string;
}

/** A measure with a unit. `compute` gets it in the base unit of its kind (m, N·m, Pa, m³/s, K; % as a number of %). */
export interface QuantityField extends Asked {
  type: 'quantity';
  /** Unit of a bare number in the API, and on the screen of a reader in metric units. */
  unit: Unit;
  /** Bounds in `unit`. */
  above?: number;
  least?: number;
  most?: number;
  optional: boolean;
  /**
   * What is usual where nobody says otherwise, in `unit`. A shop may set its own, and a reader another for the case at
   * hand. Only for rules of thumb without a standard.
   */
  usual?: number;
  /** Name of the field that holds the density, where a flow may be typed as mass or as volume. */
  density?: string;
}

/** A number without a unit: cylinders, a nut factor, a density. */
export interface NumberField extends Asked {
  type: 'number';
  whole: boolean;
  above?: number;
  least?: number;
  most?: number;
  optional: boolean;
  usual?: number;
  /** Printed after the box, for a number whose unit nobody ever changes: "kg/m³". */
  after?: string;
}

export interface ChoiceField<Value extends string = string> extends Asked {
  type: 'choice';
  options: readonly { value: Value; label: string }[];
  optional: boolean;
  /** The option chosen where nobody chose; the first where left out and the field is not optional. */
  usual?: Value;
}

export interface TextField extends Asked {
  type: 'text';
  /** Characters at most. */
  most: number;
  optional: boolean;
}

/** From, to: a limit. `compute` gets `{ min?, max? }` in the base unit. A sheet's limit can fill it. */
export interface BandField extends Asked {
  type: 'band';
  unit: Unit;
  optional: boolean;
  /** A limit of a sheet that has a nominal value puts it into the quantity field of this name. */
  nominal?: string;
}

export type Column = QuantityField | NumberField | ChoiceField | TextField;
export type Columns = Readonly<Record<string, Column>>;

/** A list of like things, a row each: injectors, cylinders, heights of a bore. Rows left wholly empty do not count. */
export interface RowsField<C extends Columns = Columns> extends Asked {
  type: 'rows';
  /** What a row is: "Injector" makes "Injector 1". */
  item: string;
  columns: C;
  least: number;
  most: number;
  /** Rows that an empty form shows. */
  start: number;
}

export type Field = Column | BandField | RowsField;
export type Fields = Readonly<Record<string, Field>>;

export interface Band {
  min?: number;
  max?: number;
}

type Value<F> =
  F extends RowsField<infer C>
    ? { [K in keyof C]: Value<C[K]> }[]
    : F extends BandField
      ? F['optional'] extends false
        ? Band
        : Band | undefined
      : F extends ChoiceField<infer V>
        ? Maybe<F, V>
        : F extends TextField
          ? Maybe<F, string>
          : Maybe<F, number>;
type Maybe<F, V> = F extends { optional: false } ? V : V | undefined;

/** What `compute` is given: numbers in base units, choices, texts, bands and rows under the fields' names. */
export type Values<F extends Fields> = { [K in keyof F]: Value<F[K]> };

type Given<F extends Field, Filled extends keyof F = never> = Omit<F, 'type' | 'optional' | Filled>;

/** A field that must be filled in; with `usual`, one that has an answer where nobody fills it in. */
export const quantity = (unit: Unit, given: Given<QuantityField, 'unit'>) =>
  ({ type: 'quantity', unit, optional: false, ...given }) satisfies QuantityField as QuantityField & {
    optional: false;
  };
export const quantityIfKnown = (unit: Unit, given: Given<QuantityField, 'unit' | 'usual'>) =>
  ({ type: 'quantity', unit, optional: true, ...given }) satisfies QuantityField as QuantityField & { optional: true };

export const number = (given: Given<NumberField, 'whole'> & { whole?: boolean }) =>
  ({ type: 'number', whole: false, optional: false, ...given }) satisfies NumberField as NumberField & {
    optional: false;
  };
export const numberIfKnown = (given: Given<NumberField, 'whole' | 'usual'> & { whole?: boolean }) =>
  ({ type: 'number', whole: false, optional: true, ...given }) satisfies NumberField as NumberField & {
    optional: true;
  };

type Options<V extends string> = readonly { value: V; label: string }[];
/** One of `options`; `usual`, else the first, where nobody chose. */
export const choice = <const V extends string>(
  options: Options<V>,
  given: Given<ChoiceField<NoInfer<V>>, 'options'>,
): ChoiceField<V> & { optional: false } => ({ type: 'choice', options, optional: false, ...given });
export const choiceIfKnown = <const V extends string>(
  options: Options<V>,
  given: Given<ChoiceField<NoInfer<V>>, 'options' | 'usual'>,
): ChoiceField<V> & { optional: true } => ({ type: 'choice', options, optional: true, ...given });

export const text = (given: Given<TextField>): TextField & { optional: false } => ({
  type: 'text',
  optional: false,
  ...given,
});
export const textIfKnown = (given: Given<TextField>): TextField & { optional: true } => ({
  type: 'text',
  optional: true,
  ...given,
});

export const band = (unit: Unit, given: Given<BandField, 'unit'>): BandField & { optional: false } => ({
  type: 'band',
  unit,
  optional: false,
  ...given,
});
export const bandIfKnown = (unit: Unit, given: Given<BandField, 'unit'>): BandField & { optional: true } => ({
  type: 'band',
  unit,
  optional: true,
  ...given,
});

export const rows = <const C extends Columns>(
  columns: C,
  given: Given<RowsField, 'columns'>,
): RowsField<C> & { optional: false } => ({
  type: 'rows',
  optional: false,
  columns,
  ...given,
});
