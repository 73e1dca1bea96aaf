import type { XMLBuilder } from 'xmlbuilder2/lib/interfaces';
import { SIGNAL_WORDS, type Caution } from '../../procedure/schema';
import { element } from './nodes';

const TYPES = { DANGER: 'danger', WARNING: 'warning', CAUTION: 'caution', NOTICE: 'notice' } as const;

/** A caution as the hazard statement domain has it: what can hurt, what it does, how to avoid it (ANSI Z535.6). */
export function hazardStatement(parent: XMLBuilder, { signal, hazard, harm, avoid }: Caution): void {
  const panel = element(element(parent, 'hazardstatement', { type: TYPES[signal] }), 'messagepanel');
  element(panel, 'typeofhazard', {}, hazard);
  element(panel, 'consequence', {}, harm);
  element(panel, 'howtoavoid', {}, avoid);
}

/** The cautions of a step, worst first, as they stand ahead of it on the sheet. */
export const cautionsOf = (keys: readonly string[], cautions: readonly Caution[]): Caution[] =>
  cautions
    .filter(({ key }) => keys.includes(key))
    .sort((a, b) => SIGNAL_WORDS.indexOf(a.signal) - SIGNAL_WORDS.indexOf(b.signal));
