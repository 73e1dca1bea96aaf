import type { CheckResult } from '@/domain/api/schemas/check';
import type { Actor } from '@/domain/people/may';
import { sizeProblem } from '@/domain/procedure/bounds';
import { clampChecks } from '@/domain/procedure/clamp';
import type { Parsed } from '@/domain/procedure/types';
import { invalid } from '../refusal';
import { parsedText } from './parsed';

/** Refuses 422 a text over 64 KB; nothing larger is read or stored. */
export function refuseOverlong(source: string): void {
  const found = sizeProblem(source);
  if (found) throw invalid(found.message, [{ ...found, path: 'source' }]);
}

/** What a parsed text is answered with. */
export function checkResult(parsed: Parsed, preview = false): CheckResult {
  if (!parsed.ok) return { ok: false, errors: parsed.errors, notices: [], toFillIn: [], clamp: [] };
  return {
    ok: true,
    errors: [],
    notices: parsed.notices,
    toFillIn: parsed.toFillIn,
    clamp: clampChecks(parsed.procedure.frontmatter.torques),
    ...(preview ? { preview: parsed.rendered } : {}),
  };
}

/** Checks a text and writes nothing. Any signed-in person may; refuses 422 a text over 64 KB. */
export async function checkSource(
  _actor: Actor,
  source: string,
  { preview = false }: { preview?: boolean | undefined } = {},
): Promise<CheckResult> {
  refuseOverlong(source);
  return checkResult(await parsedText(source), preview);
}
