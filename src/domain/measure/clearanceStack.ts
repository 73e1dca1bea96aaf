import { sameWithin } from './band';
import { OFFSET, SIZE } from './reach';
import { numberProblem, work, type FieldProblem, type Worked } from './worked';

/** A size with its limits, m. */
export interface SizeLimits {
  min: number;
  max: number;
}

const sizeProblems = (field: string, called: string, size: SizeLimits): FieldProblem[] => {
  const problems = [
    ...numberProblem(`${field}.min`, `The least ${called}`, size?.min, SIZE),
    ...numberProblem(`${field}.max`, `The greatest ${called}`, size?.max, SIZE),
  ];
  if (problems.length > 0 || size.min <= size.max) return problems;
  return [{ field: `${field}.max`, message: `The greatest ${called} cannot be less than the least.` }];
};

/**
 * What clearances two toleranced sizes can meet in: least bore less greatest journal, greatest bore less least journal.
 * Source: worked out from TM 5-3895-346-14 (see the reference test). Less than zero where the sizes can grip.
 */
export const clearanceStack = (bore: SizeLimits, journal: SizeLimits): Worked<SizeLimits> =>
  work([...sizeProblems('bore', 'bearing bore', bore), ...sizeProblems('journal', 'journal', journal)], 'bore', () => ({
    min: bore.min - journal.max,
    max: bore.max - journal.min,
  }));

/**
 * The journal sizes that keep a toleranced bore within its clearance; `clearanceStack` the other way round. A bore that
 * spreads wider than the clearance does leaves no journal.
 */
export const journalForClearance = (bore: SizeLimits, clearance: SizeLimits): Worked<SizeLimits> => {
  const problems = [
    ...sizeProblems('bore', 'bearing bore', bore),
    ...numberProblem('clearance.min', 'The least oil clearance', clearance?.min, OFFSET),
    ...numberProblem('clearance.max', 'The greatest oil clearance', clearance?.max, OFFSET),
  ];
  const journal = () => ({ min: bore.max - clearance.max, max: bore.min - clearance.min });
  if (problems.length === 0 && journal().max < journal().min && !sameWithin(journal().max, journal().min))
    problems.push({ field: 'clearance.max', message: 'No journal keeps these bores within this oil clearance.' });
  return work(problems, 'bore', journal);
};
