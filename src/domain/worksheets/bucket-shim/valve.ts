import { lowered } from '../../wording';
import { judge } from '../../measure/band';
import type { BothUnits } from '../../measure/format';
import { said, show } from '../../measure/said';
import { chooseShim, type ShimChosen } from '../../measure/shims';
import { refused, worked, type Worked } from '../../measure/worked';
import type { Band, Values } from '../fields';
import { allowed, inBoxes, lookAgain, measured, noted, verdictOf, type Finding } from '../findings';
import type { Result } from '../outcome';
import type { fields } from './schema';

type Inputs = Values<typeof fields>;

/** Feeler gauges step in hundredths of a mm; shims are measured in thousandths. */
const LASH = 0.01;
const SHIM = 0.001;
const lashOf = (metres: number) => show(metres, 'mm', LASH);
const shimOf = (metres: number) => show(metres, 'mm', SHIM);
const SOURCE = 'New shim = old shim + lash measured − lash wanted: N = T + (A − V), a service manual, quoted.';

/** Lash wanted, m: as given, else the middle of the limits, else null. */
function wantedOf(inputs: Inputs, side: 'intake' | 'exhaust'): number | null {
  const band = inputs[side];
  const middle = band?.min !== undefined && band.max !== undefined ? (band.min + band.max) / 2 : null;
  return inputs[`${side}Wanted`] ?? middle;
}

/** One valve: its lash against the limits of its side, and the shim to fit where it is out, or has no limits. */
export function oneValve(inputs: Inputs, place: number): Worked<{ findings: Finding[]; results: Result[] }> {
  const valve = inputs.valves[place];
  if (!valve) return refused({ field: `valves.${place}`, message: `Valve ${place + 1} is missing.` });
  const band = inputs[valve.side];
  const who = `Valve ${place + 1}, ${valve.side}`;
  const judged = band ? judge(valve.lash, band) : null;
  if (judged && !judged.ok) return inBoxes(judged, { value: `valves.${place}.lash`, band: valve.side });
  const found = judged?.value ?? null;
  const lash = measured(`lash-${place + 1}`, `Lash, ${lowered(who)}`, valve.lash, 'mm', LASH, {
    verdict: verdictOf(found),
  });
  if (found?.at === 'in')
    return worked({ findings: [{ verdict: 'pass', text: said`${who}: the lash passes.` }], results: [lash] });

  const chosen = shimFor(inputs, place, wantedOf(inputs, valve.side));
  if (!chosen.ok) return chosen;
  const what = shimWords(chosen.value, valve.shim, band);
  const findings: Finding[] = [];
  if (found && band) {
    const tooMuch = found.at === 'under' ? 'too little' : 'too much';
    const limit = allowed(band, 'mm', LASH);
    findings.push({
      verdict: 'fail',
      text: said`${who}: the lash is ${lashOf(valve.lash)}, ${tooMuch}; ${limit}. ${what.words}`,
    });
  } else findings.push(what.look ? lookAgain(said`${who}: ${what.words}`) : noted(said`${who}: ${what.words}`));
  return worked({
    findings,
    results: [
      lash,
      ...(chosen.value ? shimResults(place, lowered(who), chosen.value, valve, wantedOf(inputs, valve.side)) : []),
    ],
  });
}

/** Null where something that the choice needs is not known. */
function shimFor(inputs: Inputs, place: number, target: number | null): Worked<ShimChosen | null> {
  const { stock, step, valves } = inputs;
  const valve = valves[place];
  if (valve?.shim === undefined || target === null || stock?.min === undefined || stock.max === undefined)
    return worked(null);
  const { shim: old, lash, side } = valve;
  const band = inputs[side];
  const found = chooseShim({ old, measured: lash, target, stock: { min: stock.min, max: stock.max, step }, band });
  if (found.ok) return found;
  return inBoxes(found, {
    old: `valves.${place}.shim`,
    measured: `valves.${place}.lash`,
    target: inputs[`${side}Wanted`] === undefined ? `${side}.max` : `${side}Wanted`,
    'stock.step': 'step',
    band: side,
  });
}

function shimWords(
  chosen: ShimChosen | null,
  old: number | undefined,
  band: Band | undefined,
): { words: BothUnits; look: boolean } {
  if (!chosen || old === undefined)
    return {
      words: said`Give the shim that is in, the lash wanted and the stock to be told which shim to fit.`,
      look: false,
    };
  if (chosen.outside)
    return {
      words: said`It asks for ${shimOf(chosen.exact)}, ${chosen.outside}: look for a sunk valve or a cut stem, and neither stack nor grind shims.`,
      look: true,
    };
  const { thickness, lash, judged } = chosen.chosen;
  const fit = said`Fit ${shimOf(thickness)} in place of ${shimOf(old)}; the lash becomes ${lashOf(lash)}`;
  return band && judged?.at !== 'in'
    ? { words: said`${fit}, which is still out of limits: the stock has no shim between.`, look: true }
    : { words: said`${fit}.`, look: false };
}

function shimResults(
  place: number,
  who: string,
  { exact, neighbours, chosen, outside }: ShimChosen,
  valve: { shim?: number; lash: number },
  target: number | null,
): Result[] {
  const formula = said`old + measured − wanted = ${shimOf(valve.shim ?? 0)} + ${lashOf(valve.lash)} − ${lashOf(target ?? 0)} = ${shimOf(exact)}`;
  const key = (name: string) => `${name}-${place + 1}`;
  return [
    ...(outside ? [] : [measured(key('shim'), `Shim to fit, ${who}`, chosen.thickness, 'mm', SHIM, { main: true })]),
    measured(key('exact'), `Exact shim, ${who}`, exact, 'mm', SHIM, { formula, source: SOURCE }),
    ...neighbours.flatMap(({ thickness, lash, judged }, n) => {
      const which = neighbours.length === 1 ? 'nearest' : n === 0 ? 'thinner' : 'thicker';
      return [
        measured(key(which), `The ${which} size in stock, ${who}`, thickness, 'mm', SHIM),
        measured(key(`${which}-lash`), `Lash with the ${which} size, ${who}`, lash, 'mm', LASH, {
          verdict: verdictOf(judged),
        }),
      ];
    }),
  ];
}
