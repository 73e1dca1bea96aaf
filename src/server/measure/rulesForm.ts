import type { Actor } from '@/domain/people/may';
import { ruleText } from '@/domain/worksheets/ruleWords';
import { rulesOf } from '@/domain/worksheets/shopRules';
import { textsOf } from '../http/form';
import { malformed, Refusal } from '../refusal';
import { setRules, type RuleChange } from './setRules';

/** What the form of the rules page came to. Where it was refused, all that was typed comes back, by the names of the rules. */
export type RulesOutcome =
  | { kind: 'saved'; changed: number }
  | { kind: 'refused'; status: number; detail: string; errors: Record<string, string>; typed: Record<string, string> };

/**
 * Saves the form of the rules page: `units`, and for each rule `value.<name>` as it was typed and `was.<name>`, the number
 * that was set when the page was made. A box that still says what it said changes nothing, whoever has set it since.
 * Refusals that can be mended in the form come back as words; others are thrown.
 */
export async function actOnRulesForm(actor: Actor, shopId: string, form: FormData): Promise<RulesOutcome> {
  const texts = textsOf(form);
  const { units } = texts;
  if (units !== 'metric' && units !== 'inch')
    throw malformed('The form came without some of its fields. Go back and send it again.');
  const typed: Record<string, string> = {};
  const changes = rulesOf().flatMap((rule): RuleChange[] => {
    const { name } = rule;
    const value = texts[`value.${name}`];
    const was = texts[`was.${name}`];
    if (value === undefined || was === undefined) return [];
    typed[name] = value;
    const set = was === '' || !Number.isFinite(Number(was)) ? null : Number(was);
    return value.trim() === ruleText(rule, set, units) ? [] : [{ name, value, was: set, path: name }];
  });
  try {
    return { kind: 'saved', changed: await setRules(actor, shopId, changes, units) };
  } catch (error) {
    if (!(error instanceof Refusal) || ![409, 422].includes(error.status)) throw error;
    const errors = Object.fromEntries((error.errors ?? []).map(({ path, message }) => [path, message]));
    return { kind: 'refused', status: error.status, detail: error.detail, errors, typed };
  }
}
