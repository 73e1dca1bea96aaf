import type { XMLBuilder } from 'xmlbuilder2/lib/interfaces';
import { durationText } from '../../procedure/values';
import type { Caution, Frontmatter, SOURCE_KINDS } from '../../procedure/schema';
import { hazardStatement } from './hazard';
import { element, table } from './nodes';
import { limitRow, timeRows, torqueRow, VALUE_COLUMNS } from './valueRows';

const KINDS: Record<(typeof SOURCE_KINDS)[number], string> = {
  maker: "maker's service information",
  standard: 'standard',
  shop: 'measured in the shop',
  practice: 'common practice',
  demonstration: 'invented for demonstration',
};

/**
 * What to lay out, and all that the task works to with its state and its origin.
 *
 * @param atLarge cautions that no step names, which hold for the whole task
 */
export function prereq(body: XMLBuilder, f: Frontmatter, atLarge: readonly Caution[]): void {
  const made = element(body, 'prereq');
  element(made, 'p', {}, "The maker's current service information, local rules and licensed practice come first.");
  if (f.sources.some(({ kind }) => kind === 'demonstration'))
    element(made, 'p', {}, 'Values marked as demonstration are not for work on a real engine.');
  for (const caution of atLarge) hazardStatement(made, caution);
  table(
    made,
    'Parts',
    ['Part', 'Number', 'Quantity', 'What happens to it', 'Note'],
    f.parts.map(({ name, number, quantity, action, note }) => [
      name,
      number ?? '',
      String(quantity),
      action,
      note ?? '',
    ]),
  );
  table(
    made,
    'Tools',
    ['Tool', 'Range', 'Note'],
    f.tools.map(({ name, range, note }) => [name, range ?? '', note ?? '']),
  );
  const time = (minutes: number | undefined) => (minutes === undefined ? '' : durationText(minutes));
  table(
    made,
    'Supplies',
    ['Supply', 'Skins over in', 'Full cure', 'Note'],
    f.supplies.map(({ name, skinOver, cure, note }) => [name, time(skinOver), time(cure), note ?? '']),
  );
  table(
    made,
    'Torques',
    VALUE_COLUMNS,
    f.torques.map((torque) => torqueRow(torque, f)),
  );
  table(
    made,
    'Limits',
    VALUE_COLUMNS,
    f.limits.map((limit) => limitRow(limit, f)),
  );
  table(made, 'Times', VALUE_COLUMNS, timeRows(f));
  table(
    made,
    'Where the values come from',
    ['Origin', 'Kind', 'Detail'],
    f.sources.map(({ title, kind, detail }) => [title, KINDS[kind], detail ?? '']),
  );
}
