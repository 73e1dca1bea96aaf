import { may, type Actor } from '@/domain/people/may';
import { ruleWords } from '@/domain/worksheets/ruleWords';
import { readRule, rulesOf, type RuleOfThumb } from '@/domain/worksheets/shopRules';
import { appendAudit } from '../audit/append';
import { app } from '../context';
import { forbidden, invalid, notFound, Refusal, type RefusalError } from '../refusal';
import { askedShop, readRules, standingRules, type RuleSetting, type SetRule } from './rules';

/** What somebody wants a rule of thumb to be. */
export interface RuleChange {
  name: string;
  /** A number in the unit of the rule, or a text in any unit of its kind; null or empty for the usual value. */
  value: number | string | null;
  /** What was set when they looked, null for nothing; left out where they did not look. */
  was?: number | null;
  /** Where an error of it is told. */
  path: string;
}

type Units = 'metric' | 'inch';
interface Wanted extends RuleChange {
  rule: RuleOfThumb;
  to: number | null;
}

function wantedOf(changes: readonly RuleChange[], units: Units): Wanted[] {
  const rules = new Map(rulesOf().map((rule) => [rule.name, rule]));
  const errors: RefusalError[] = [];
  const wanted = changes.flatMap((change): Wanted[] => {
    const rule = rules.get(change.name);
    if (!rule) throw notFound('There is no such rule of thumb.');
    const { value, path } = change;
    if (value === null || (typeof value === 'string' && value.trim() === '')) return [{ ...change, rule, to: null }];
    const read = readRule(rule, value, units);
    if (read.ok) return [{ ...change, rule, to: read.value }];
    errors.push({ path, message: read.message });
    return [];
  });
  if (errors.length > 0) throw invalid('Some values cannot be used. Nothing was saved.', errors);
  return wanted;
}

/**
 * Sets rules of thumb for a shop, all of them or none. What stays as it is leaves no trace; each change is in the audit trail.
 *
 * @param units of bare numbers in texts
 * @returns how many were changed
 * @throws Refusal 404 and 403 as `may` says, and for an unknown rule; 422 with the path of each value that cannot be;
 *   409 with the path of each that somebody else has set since
 */
export async function setRules(
  actor: Actor,
  shopId: string,
  changes: readonly RuleChange[],
  units: Units = 'metric',
): Promise<number> {
  const permission = may(actor, 'changeShopSettings', { shopId });
  if (!permission.ok) throw permission.visible ? forbidden(permission.why) : notFound();
  const { db } = await app();
  if (!(await db.read<object>('SELECT 1 FROM shops WHERE id = :shopId', { shopId })).length) throw notFound();
  const wanted = wantedOf(changes, units);
  return db.write(async () => {
    const standing = await standingRules(shopId);
    const now = (name: string) => standing.get(name)?.value ?? null;
    const lost = wanted.filter(({ name, was, to }) => was !== undefined && was !== now(name) && to !== now(name));
    if (lost.length > 0)
      throw new Refusal(
        409,
        'stale',
        'Changed in the meantime',
        'Somebody else has changed some of these in the meantime. Nothing was saved.',
        { errors: lost.map(({ path, rule, name }) => ({ path, message: lostWords(rule, standing.get(name), units) })) },
      );
    const changed = wanted.filter(({ name, to }) => to !== now(name));
    for (const { name, to, rule } of changed) {
      await store(shopId, name, to, actor.personId);
      await appendAudit({
        actorId: actor.personId,
        act: to === null ? 'shop.rule-cleared' : 'shop.rule-set',
        subject: { type: 'shop', id: shopId },
        shopId,
        detail: { rule: name, from: now(name), to, usual: rule.usual, unit: rule.unit ?? rule.after ?? null },
      });
    }
    return changed.length;
  });
}

/**
 * Sets one rule of thumb, or puts it back to the usual value where `value` is null or empty.
 *
 * @param shopId the shop that the actor works in now, where left out
 * @throws Refusal as `setRules`; the path of a value that cannot be is `value`
 */
export async function setRule(
  actor: Actor,
  name: string,
  value: number | string | null,
  shopId?: string,
): Promise<RuleSetting> {
  const id = await askedShop(actor, shopId);
  await setRules(actor, id, [{ name, value, path: 'value' }]);
  const { settings } = await readRules(actor, id);
  const setting = settings.find(({ rule }) => rule.name === name);
  if (!setting) throw notFound();
  return setting;
}

const lostWords = (rule: RuleOfThumb, set: SetRule | undefined, units: Units): string =>
  set
    ? `${set.by.name} has set ${ruleWords(rule, set.value, units)} in the meantime. Save again to have yours.`
    : 'This was put back to the usual value in the meantime. Save again to have yours.';

async function store(shopId: string, name: string, value: number | null, setById: string): Promise<void> {
  const { ShopRule } = (await app()).db.models;
  const where = { shopId, name };
  if (value === null) return void (await ShopRule.destroy({ where }));
  const [updated] = await ShopRule.update({ value, setById }, { where });
  if (updated === 0) await ShopRule.create({ ...where, value, setById });
}
