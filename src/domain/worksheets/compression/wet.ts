import { said, show } from '../../measure/said';
import { wetTest } from '../../measure/wetTest';
import { worked, type Worked } from '../../measure/worked';
import type { Values } from '../fields';
import { inBoxes, measured, noted, type Finding } from '../findings';
import type { Result } from '../outcome';
import type { fields } from './schema';

const percent = (share: number) => show(share, '%', 1);

/** What the repeat with oil says, for the cylinders that have one. */
export function wetFindings({
  cylinders,
  layout,
  rise,
}: Values<typeof fields>): Worked<{ findings: Finding[]; results: Result[] }> {
  if (cylinders.every(({ wet }) => wet === undefined)) return worked({ findings: [], results: [] });
  const neighbours = layout === 'line' ? cylinders.slice(1).map((_, i): [number, number] => [i, i + 1]) : [];
  const found = wetTest({
    dry: cylinders.map(({ dry }) => dry),
    wet: cylinders.map(({ wet }) => wet ?? null),
    risePercent: rise,
    neighbours,
  });
  if (!found.ok) return inBoxes(found, { risePercent: 'rise', dry: 'cylinders', wet: 'cylinders' });
  const results: Result[] = [];
  const findings = found.value.cylinders.flatMap(({ pointsAt, risePercent, rise: gained }, place): Finding[] => {
    if (pointsAt === null || gained === null) return [];
    const who = `cylinder ${place + 1}`;
    results.push(measured(`rise-${place + 1}`, `Rise with oil, ${who}`, gained, 'kPa', 10));
    const by = risePercent === null ? show(gained, 'kPa', 10) : percent(risePercent);
    return [
      pointsAt === 'rings'
        ? noted(said`With oil, ${who} rises by ${by}: the rings.`)
        : noted(said`With oil, ${who} changes by ${by}, less than ${percent(rise)}: a valve or the gasket.`),
    ];
  });
  const between = found.value.gasketBetween.map(([a, b]) =>
    noted(
      said`Cylinders ${a + 1} and ${b + 1} are neighbours and neither rises: look at the gasket between them first.`,
    ),
  );
  return worked({ findings: [...findings, ...between], results });
}
