import { bandsOf } from '../../procedure/bindings';
import { COMPONENTS, componentOf, STAGES, isStage } from '../../procedure/components';
import type { ListName } from '../../procedure/fields';
import { WORKSHEET_KINDS, worksheetTitle } from '../../procedure/worksheets';
import { looseHead, type LooseHead } from './looseHead';
import { keyOffers, type Offer, type Offers } from './offer';

const NAME = /<([A-Z][A-Za-z]*)?$/;
const ATTRIBUTE = /<([A-Z][A-Za-z]*)((?:\s+[a-z]+="[^"<>]*")*)\s+([a-z]*)$/;
const VALUE = /<([A-Z][A-Za-z]*)((?:\s+[a-z]+="[^"<>]*")*)\s+([a-z]+)="([^"<>]*)$/;

const STANDS = { sentence: 'among words', block: 'on its own in a step', step: 'a step of the sheet' } as const;

/** The list that each component points at by `of`. A timer and a worksheet are told below. */
const POINTS_AT: Readonly<Record<string, ListName>> = {
  Caution: 'cautions',
  Torque: 'torques',
  Limit: 'limits',
  Part: 'parts',
  Figure: 'figures',
};

const given = (written: string): Record<string, string> =>
  Object.fromEntries([...written.matchAll(/([a-z]+)="([^"]*)"/g)].map(([, name = '', value = '']) => [name, value]));

function nameOffers(): Offer[] {
  return Object.entries(COMPONENTS).map(([label, { stands, holds, attributes }]) => {
    const [first] = Object.keys(attributes);
    const start = first ? `${label} ${first}="` : `${label}>`;
    const required = Object.entries(attributes)
      .slice(1)
      .flatMap(([name, need]) => (need === 'required' ? [` ${name}=""`] : []))
      .join('');
    const end = holds === 'nothing' ? ' />' : first ? `>\n\n</${label}>` : `</${label}>`;
    return {
      label,
      detail: STANDS[stands],
      insert: `${start}${first ? '"' : ''}${required}${end}`,
      caret: start.length,
    };
  });
}

function torquePasses(of: string | undefined, head: LooseHead): Offer[] {
  const torque = head.lists.torques.find(({ key }) => key === of);
  return (torque?.['passes']?.match(/\d+(\.\d+)?/g) ?? []).map((nm, i) => ({ label: `${i + 1}`, detail: `${nm} N·m` }));
}

function timerKeys(stage: string | undefined, { lists }: LooseHead): Offer[] {
  const supplies = lists.supplies.filter((supply) =>
    isStage(stage) ? supply[STAGES[stage]] : supply['cure'] || supply['skinOver'],
  );
  if (stage !== undefined) return keyOffers('supplies', supplies);
  const asking = keyOffers('supplies', supplies).map((offer) => ({
    ...offer,
    detail: `${offer.detail}, with its stage`,
  }));
  return [...keyOffers('timers', lists.timers), ...asking];
}

function stages(of: string | undefined, { lists }: LooseHead): Offer[] {
  const supply = lists.supplies.find(({ key }) => key === of);
  return Object.entries(STAGES)
    .filter(([, field]) => !supply || supply[field])
    .map(([label, field]) => ({ label, detail: supply ? `${supply[field]} min` : '' }));
}

/** Limits by key behind what was written before, and the fields of the worksheet that one can stand for. */
function worksheetLimits(kind: string, written: string, { lists }: LooseHead): { typed: string; offers: Offer[] } {
  const token = written.split(/\s+/).at(-1) ?? '';
  const [band, key] = token.includes(':') ? token.split(':') : [null, token];
  const limits = keyOffers('limits', lists.limits);
  const bands =
    band === null ? bandsOf(kind).map((name) => ({ label: `${name}:`, detail: 'judged by one of the limits' })) : [];
  return { typed: key ?? '', offers: [...limits, ...bands] };
}

function valueOffers(name: string, attribute: string, others: Record<string, string>, head: LooseHead): Offer[] {
  if (name === 'Timer') return attribute === 'stage' ? stages(others['of'], head) : timerKeys(others['stage'], head);
  if (name === 'Worksheet' && attribute === 'kind')
    return WORKSHEET_KINDS.map((kind) => ({ label: kind, detail: worksheetTitle(kind) ?? '' }));
  if (name === 'Torque' && attribute === 'pass') return torquePasses(others['of'], head);
  const list = attribute === 'of' ? POINTS_AT[name] : undefined;
  return list ? keyOffers(list, head.lists[list]) : [];
}

/**
 * What can stand at the caret in a component of the body: its name, an attribute that it has not, or what the attribute may
 * point at. Null outside of a tag.
 */
export function tagOffers(text: string, at: number): Offers | null {
  // A tag is short; whatever stands further back is another one.
  const before = text.slice(Math.max(0, at - 500), at);
  const name = NAME.exec(before);
  if (name) return { from: at - (name[1]?.length ?? 0), offers: nameOffers() };
  const value = VALUE.exec(before);
  if (value) {
    const [, component = '', written = '', attribute = '', typed = ''] = value;
    // What stands behind the caret in the same tag counts as well.
    const behind = /^[^<>]*/.exec(text.slice(at, at + 300))?.[0].replace(/^[^"]*"/, '') ?? '';
    const others = { ...given(written), ...given(behind) };
    const head = looseHead(text);
    if (component === 'Worksheet' && attribute === 'of') {
      const limits = worksheetLimits(others['kind'] ?? '', typed, head);
      return { from: at - limits.typed.length, offers: limits.offers };
    }
    return { from: at - typed.length, offers: valueOffers(component, attribute, others, head) };
  }
  const attribute = ATTRIBUTE.exec(before);
  const attributes = componentOf(attribute?.[1] ?? null)?.attributes;
  if (!attribute || !attributes) return null;
  const [, , written = '', typed = ''] = attribute;
  const there = given(written);
  return {
    from: at - typed.length,
    offers: Object.entries(attributes)
      .filter(([label]) => !Object.hasOwn(there, label))
      .map(([label, need]) => ({ label, detail: need, insert: `${label}=""`, caret: label.length + 2 })),
  };
}
