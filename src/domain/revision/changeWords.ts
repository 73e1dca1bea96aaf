import type { Procedure, Step } from '../procedure/types';
import { compareProcedures } from './compare';
import type { StepChange } from './types';
import { valueWords } from './valueWords';

/** What a revision changed, a line each: values first, then steps, then the words around them. */
export interface ChangeWords {
  lines: ChangeLine[];
  /** Its gravest effect in words, as the desk told it; null for an ordinary change. */
  grave: string | null;
}

export interface ChangeLine {
  /** "Cover bolt torque, 10 to 12 N·m" */
  what: string;
  /** What it does at the bench: "Clamps 20 % harder"; null where nothing can be said. */
  effect: string | null;
}

const same = (runs: StepChange['title']) => runs.every(({ kind }) => kind === 'same');
const titleOf = ({ title, kind }: StepChange) =>
  title
    .filter((run) => run.kind !== (kind === 'removed' ? 'added' : 'removed'))
    .map(({ text }) => text)
    .join('');

/** How the step itself differs; where only a value that it points at does, the value has been told. */
function editOf(before: Step | undefined, after: Step | undefined): string[] {
  if (!before || !after) return [];
  if (before.title !== after.title || before.body !== after.body) return ['reworded'];
  return before.cautions.join(' ') === after.cautions.join(' ') ? [] : ['other cautions'];
}

/** What became of a step; nothing where only a value that it points at is another one, for that is told by itself. */
export function stepLine(step: StepChange, before: Step | undefined, after: Step | undefined): ChangeLine[] {
  const name = `Step “${titleOf(step)}”`;
  const effect = step.effects.join('. ') || null;
  if (step.kind === 'added' || step.kind === 'removed') return [{ what: `${name}, ${step.kind}`, effect }];
  const how = [
    ...editOf(before, after),
    ...(step.moved ? [`moved from place ${step.fromNumber ?? '?'} to ${step.toNumber ?? '?'}`] : []),
  ];
  return how.length > 0 ? [{ what: `${name}, ${how.join(' and ')}`, effect }] : [];
}

/** What one text changed of another, as a history tells it. */
export function changeWords(from: Procedure, to: Procedure): ChangeWords {
  const { values, steps, intro, severity } = compareProcedures(from, to);
  const stepOf = (procedure: Procedure, id: string) => procedure.steps.find((step) => step.id === id);
  return {
    lines: [
      ...values.map((change) => ({ what: valueWords(change), effect: change.effect })),
      ...steps.flatMap((step) => stepLine(step, stepOf(from, step.id), stepOf(to, step.id))),
      ...(same(intro) ? [] : [{ what: 'The introduction, reworded', effect: null }]),
    ],
    grave: severity.level === 'grave' ? (severity.because[0] ?? null) : null,
  };
}
