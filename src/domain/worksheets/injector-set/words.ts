import type { InjectorSetFound } from '../../measure/injectors';
import { said, show } from '../../measure/said';
import { allowed, inShort, judgedFinding, noted, type Finding } from '../findings';
import type { Inputs, JudgedBy } from './judge';

/** Flow benches read to 1 cc/min. */
export const FINE = 1;
export const flowOf = (flow: number) => show(flow, 'cc/min', FINE);
export const percentOf = (share: number) => show(share, '%', 0.1);
/** 25 % of four, 33.3 % of three. */
export const shareFine = (share: number) => (Number.isInteger(share) ? 1 : 0.1);

/** What each injector does wrong, the spread, and what one injector answers for. */
export function findingsOf(inputs: Inputs, found: InjectorSetFound, by: JudgedBy): Finding[] {
  const run = found[found.judgedRun];
  const each = inputs.injectors.flatMap((_, place) => oneInjector(inputs, found, by, place));
  const within = allowed(by.flow, 'cc/min', FINE);
  const spread = judgedFinding({
    subject: 'The spread of the set is',
    value: run?.spreadPercent ?? 0,
    judged: found.spread,
    band: by.spread,
    unit: '%',
    fineness: 0.1,
  });
  const notes = [
    noted(
      said`One injector of ${found.injectors.length} answers for ${show(found.sharePercent, '%', shareFine(found.sharePercent))} of the power.`,
    ),
    ...(found.judgedRun === 'before' ? [noted(said`Judged as it came out; there is no run after cleaning.`)] : []),
  ];
  return [...inShort(each, said`Every injector passes; ${within}.`), ...spread, ...notes];
}

function oneInjector(inputs: Inputs, found: InjectorSetFound, by: JudgedBy, place: number): Finding[] {
  const one = found.injectors[place];
  const flow = one?.[found.judgedRun];
  if (!one || !flow) return [];
  const who = `Injector ${place + 1}`;
  if (one.passes) return [{ verdict: 'pass', text: said`${who} passes.` }];
  const row = inputs.injectors[place];
  return one.faults.map((fault): Finding => {
    const off = percentOf(Math.abs(flow.deviationPercent));
    const limit = allowed(by.flow, 'cc/min', FINE);
    const texts = {
      'flows too little': said`${who} flows ${flowOf(flow.flow)}, ${off} below nominal, too little: ${limit}.`,
      'flows too much': said`${who} flows ${flowOf(flow.flow)}, ${off} above nominal, too much: ${limit}.`,
      drips: said`${who} drips, ${row?.drops ?? 0} in the hold; the most allowed is ${by.drops?.max ?? 0}.`,
      'sprays badly': said`${who} sprays ${SPRAYS[row?.spray ?? 'none']}; only an even spray passes.`,
    };
    return { verdict: 'fail', text: texts[fault] };
  });
}

const SPRAYS = { even: 'evenly', 'one-sided': 'to one side', streams: 'in streams', none: 'nothing' } as const;
