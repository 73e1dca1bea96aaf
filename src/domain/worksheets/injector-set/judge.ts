import { bandAround } from '../../measure/band';
import { judgeInjectors, type Injector, type InjectorSetFound } from '../../measure/injectors';
import type { Worked } from '../../measure/worked';
import type { Band, Values } from '../fields';
import { inBoxes } from '../findings';
import type { fields } from './schema';

export type Inputs = Values<typeof fields>;

export interface JudgedBy {
  flow: Band;
  spread: Band;
  drops: Band | undefined;
}

/** The set, and the limits it was judged by: those given, else the shop's tolerances. */
export function judgeSet(inputs: Inputs): Worked<{ found: InjectorSetFound; by: JudgedBy }> {
  const { nominal, deviation, matching, spread, drops } = inputs;
  const around = bandAround(nominal, deviation);
  if (!around.ok) return inBoxes(around, { percent: 'deviation' });
  const by = { flow: inputs.flow ?? around.value, spread: spread ?? { max: matching }, drops };
  const injectors = inputs.injectors.map(({ before, after, drops: counted, spray }): Injector => ({
    ...(before !== undefined && { before }),
    ...(after !== undefined && { after }),
    ...(counted !== undefined && { drops: counted }),
    ...(spray !== undefined && { spray }),
  }));
  const found = judgeInjectors({ nominal, injectors, limits: by });
  if (found.ok) return { ok: true, value: { found: found.value, by } };
  return inBoxes(found, { 'limits.flow': 'flow', 'limits.spread': 'spread', 'limits.drops': 'drops' });
}
