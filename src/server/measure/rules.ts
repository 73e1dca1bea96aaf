import { may, type Actor } from '@/domain/people/may';
import type { ShopRules } from '@/domain/worksheets/readInputs';
import { readRule, rulesOf, type RuleOfThumb } from '@/domain/worksheets/shopRules';
import type { Worksheet } from '@/domain/worksheets/worksheet';
import { currentShop } from '../accounts/currentShop';
import { app } from '../context';
import { notFound } from '../refusal';

export interface Shop {
  id: string;
  name: string;
}

/** What a shop has set for one rule, by whom and when. */
export interface SetRule {
  value: number;
  by: { id: string; name: string };
  at: string;
}

/** A rule of thumb and what the shop has set for it; null where the usual value stands. */
export interface RuleSetting {
  rule: RuleOfThumb;
  set: SetRule | null;
}

interface Row {
  name: string;
  value: number;
  at: string;
  personId: string;
  person: string;
}

/**
 * What a shop has set, by the name of the rule. What no longer fits its field, because a later release has changed the
 * field, stands nowhere: it is as if it had not been set.
 */
export async function standingRules(shopId: string): Promise<Map<string, SetRule>> {
  const { db } = await app();
  const rows = await db.read<Row>(
    `SELECT r.name, r.value, r.updatedAt AS at, p.id AS personId, p.name AS person
     FROM shopRules r JOIN people p ON p.id = r.setById WHERE r.shopId = :shopId`,
    { shopId },
  );
  const rules = new Map(rulesOf().map((rule) => [rule.name, rule]));
  return new Map(
    rows.flatMap(({ name, value, at, personId, person }) => {
      const rule = rules.get(name);
      return rule && readRule(rule, value).ok ? [[name, { value, at, by: { id: personId, name: person } }]] : [];
    }),
  );
}

/** What stands for one worksheet in the shop that the actor works in now; nothing for those in no shop. */
export async function shopRules(actor: Actor, worksheet: Worksheet): Promise<ShopRules> {
  const rules = rulesOf([worksheet]);
  if (rules.length === 0) return {};
  const shopId = await currentShop(actor);
  if (!shopId || !may(actor, 'readShopSettings', { shopId }).ok) return {};
  const standing = await standingRules(shopId);
  return Object.fromEntries(
    rules.flatMap(({ name, field }) => {
      const set = standing.get(name);
      return set ? [[field, set.value]] : [];
    }),
  );
}

/** The shop that a call is about: the one it names, else the one that the actor works in now. Refuses 404 where there is none. */
export async function askedShop(actor: Actor, shopId: string | undefined): Promise<string> {
  const id = shopId ?? (await currentShop(actor));
  if (id === null) throw notFound('You work in no shop. Say which shop you mean.');
  return id;
}

/** Shops whose settings the actor changes, by name: an owner's own, for the steward all. */
export async function shopsToSet(actor: Actor): Promise<Shop[]> {
  const { db } = await app();
  const shops = await db.read<Shop>('SELECT id, name FROM shops ORDER BY name');
  return shops.filter(({ id }) => may(actor, 'changeShopSettings', { shopId: id }).ok);
}

/**
 * All rules of thumb with what a shop has set.
 *
 * @param shopId the shop that the actor works in now, where left out
 * @throws Refusal 404 for an unknown shop, for one that is not the actor's, and for an actor without a shop
 */
export async function readRules(actor: Actor, shopId?: string): Promise<{ shop: Shop; settings: RuleSetting[] }> {
  const id = await askedShop(actor, shopId);
  if (!may(actor, 'readShopSettings', { shopId: id }).ok) throw notFound();
  const { db } = await app();
  const [shop] = await db.read<Shop>('SELECT id, name FROM shops WHERE id = :id', { id });
  if (!shop) throw notFound();
  const standing = await standingRules(id);
  return { shop, settings: rulesOf().map((rule) => ({ rule, set: standing.get(rule.name) ?? null })) };
}
