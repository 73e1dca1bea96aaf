import { quantityOf, isUnit } from '../measure/convert';
import { worksheetNamed } from '../worksheets/registry';
import type { Limit } from './schema';

/** One limit that a worksheet of a step names, and the field of the worksheet that it is the limit of. */
export interface Binding {
  /** Null where the reading is only written down beside its limit. */
  field: string | null;
  key: string;
}

/** The limits in `of`: `clearance:main-clearance oil-level` judges the field `clearance` by one and lists the other. */
export const bindingsIn = (of: string | undefined): Binding[] =>
  (of ?? '')
    .split(/\s+/)
    .filter(Boolean)
    .map((token) => {
      const at = token.indexOf(':');
      return at < 0 ? { field: null, key: token } : { field: token.slice(0, at), key: token.slice(at + 1) };
    });

/** Keys of the limits without their fields, each once, in the order first named. */
export const limitKeysIn = (of: string | undefined): string[] => [...new Set(bindingsIn(of).map(({ key }) => key))];

/** Fields of a worksheet that a limit of the sheet can stand for. */
export const bandsOf = (kind: string): string[] =>
  Object.entries(worksheetNamed(kind)?.fields ?? {}).flatMap(([name, one]) => (one.type === 'band' ? [name] : []));

/** Why a limit cannot stand for a field of a worksheet, in a sentence; null where it can. */
export function bindingFault(kind: string, { field, key }: Binding, limit: Limit | undefined): string | null {
  if (field === null) return null;
  const fields = worksheetNamed(kind)?.fields ?? {};
  const bands = bandsOf(kind);
  const asked = Object.hasOwn(fields, field) ? fields[field] : undefined;
  if (asked?.type !== 'band')
    return `"${field}" is no limit of this worksheet. ${bands.length > 0 ? `It judges ${bands.join(', ')}.` : 'It judges nothing by limits.'}`;
  if (!limit) return null;
  if (!limit.unit || !isUnit(limit.unit) || quantityOf(limit.unit) !== quantityOf(asked.unit))
    return `"${key}" cannot judge ${field}: it is no ${quantityOf(asked.unit)}.`;
  return null;
}
