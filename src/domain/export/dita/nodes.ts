import type { XMLBuilder } from 'xmlbuilder2/lib/interfaces';
import type { BothUnits } from '@/domain/measure/format';
import { xmlText } from '../xmlText';

export type Attributes = Readonly<Record<string, string | undefined>>;

/** A child element, with its text where it has nothing but text. Answers the child. */
export function element(parent: XMLBuilder, name: string, attributes: Attributes = {}, text?: string): XMLBuilder {
  const given = Object.fromEntries(
    Object.entries(attributes).flatMap(([key, value]) => (value === undefined ? [] : [[key, xmlText(value)]])),
  );
  const child = parent.ele(name, given);
  if (text !== undefined) child.txt(xmlText(text));
  return child;
}

/** "10 ±1 N·m (89 ±9 lbf·in)": a value in words for readers of both unit systems, who see no switch here. */
export const bothWords = ({ metric, inch }: BothUnits): string => (metric === inch ? metric : `${metric} (${inch})`);

/** A table of the exchange model that DITA takes over from CALS. A row without cells is left out. */
export function table(
  parent: XMLBuilder,
  title: string,
  columns: readonly string[],
  rows: readonly (readonly string[])[],
): void {
  if (rows.length === 0) return;
  const made = element(parent, 'table');
  element(made, 'title', {}, title);
  const group = element(made, 'tgroup', { cols: String(columns.length) });
  columns.forEach((_, i) => element(group, 'colspec', { colname: `c${i + 1}` }));
  const head = element(element(group, 'thead'), 'row');
  for (const name of columns) element(head, 'entry', {}, name);
  const body = element(group, 'tbody');
  for (const cells of rows) {
    const row = element(body, 'row');
    for (const cell of cells) element(row, 'entry', {}, cell);
  }
}
