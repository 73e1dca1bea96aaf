import { capital } from '../wording';
import { fieldProblems, sentenceErrors } from '../procedure/frontmatterProblems';
import { Frontmatter } from '../procedure/schema';
import { START } from '../procedure/problems';
import type { Procedure, SourceProblem } from '../procedure/types';

/** What the schema finds wrong in the front matter, at once and without the server; the same sentences as there. */
export function headProblems(procedure: Procedure): SourceProblem[] {
  const result = Frontmatter.safeParse(procedure.frontmatter, { errorMap: sentenceErrors });
  return result.success ? [] : fieldProblems(result.error.issues, procedure.frontmatter, () => START);
}

/** The sentence without the entry that it stands beside anyway: "Tolerance must be smaller than the torque itself." */
export function besideField(message: string): string {
  const own = message.replace(/^[A-Z][a-z]+ \d+( \(.*?\))?: /, '');
  return capital(own);
}

/** Problems that stand at a field or inside it (`passes.1` in `passes`), as one text; undefined where there are none. */
export function problemAt(problems: readonly SourceProblem[], path: string): string | undefined {
  const found = problems.filter((p) => p.path === path || p.path?.startsWith(`${path}.`));
  return found.length ? [...new Set(found.map((p) => besideField(p.message)))].join(' ') : undefined;
}
