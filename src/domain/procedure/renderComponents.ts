import type { Element as HastElement, ElementContent, Properties } from 'hast';
import type { BothUnits } from '../measure/format';
import type { Element } from './attributes';
import { bindingsIn, type Binding } from './bindings';
import { given, referenceOf, valueOf } from './references';
import type { Frontmatter, Limit } from './schema';
import type { Reference } from './types';
import { limitText } from './values';
import { READINGS, worksheetTitle } from './worksheets';

export function h(tagName: string, properties: Properties, ...children: (ElementContent | string)[]): HastElement {
  return {
    type: 'element',
    tagName,
    properties,
    children: children.map((c) => (typeof c === 'string' ? { type: 'text', value: c } : c)),
  };
}

/** A value in both unit systems; the page shows the one that its reader has chosen. */
function valueSpan(reference: Reference, text: BothUnits): HastElement {
  const properties: Properties = {
    className: ['value'],
    dataKind: reference.kind,
    ...('key' in reference && { dataKey: reference.key }),
    ...(reference.kind === 'torque' && reference.pass !== undefined && { dataPass: String(reference.pass) }),
    ...(reference.kind === 'timer' && reference.stage && { dataStage: reference.stage }),
  };
  return text.metric === text.inch
    ? h('span', properties, text.metric)
    : h(
        'span',
        properties,
        h('span', { dataUnits: 'metric' }, text.metric),
        h('span', { dataUnits: 'inch' }, text.inch),
      );
}

function figure(key: string, head: Frontmatter): HastElement[] {
  return head.figures
    .filter((f) => f.key === key)
    .map((f) =>
      h(
        'figure',
        { dataKey: f.key },
        h('img', { src: `/figures/${f.file}`, alt: f.alt, loading: 'lazy', decoding: 'async' }),
        h('figcaption', {}, f.caption),
      ),
    );
}

function reading(limit: Limit): HastElement {
  const name: (HastElement | string)[] = limit.condition
    ? [limit.name, ' ', h('small', {}, limit.condition)]
    : [limit.name];
  const value = valueSpan({ kind: 'limit', key: limit.key }, limitText(limit));
  return h('tr', {}, h('th', { scope: 'row' }, ...name), h('td', {}, value), h('td', {}));
}

/** What the page's script needs to open the worksheet with the sheet's own limits in place. */
function boundLimits(bindings: readonly Binding[], head: Frontmatter): string {
  const bound = bindings.flatMap(({ field, key }) => {
    const limit = head.limits.find((l) => l.key === key);
    if (field === null || !limit) return [];
    const { name, min, max, nominal, unit } = limit;
    return [{ field, name, min, max, nominal, unit, text: limitText(limit) }];
  });
  return JSON.stringify(bound);
}

/** A table to write readings in, on paper as well; without limits only the name of the worksheet. */
function worksheet(kind: string, bindings: readonly Binding[], head: Frontmatter): HastElement {
  const title = worksheetTitle(kind) ?? kind;
  const keys = new Set(bindings.map(({ key }) => key));
  const limits = [...keys].flatMap((key) => head.limits.filter((l) => l.key === key));
  const properties = {
    className: ['worksheet'],
    dataWorksheet: kind,
    ...(kind !== READINGS && { dataBound: boundLimits(bindings, head) }),
  };
  if (limits.length === 0) return h('p', properties, `Worksheet: ${title.toLowerCase()}`);
  const columns = ['Measure', 'Limit', 'Reading'].map((text) => h('th', { scope: 'col' }, text));
  return h(
    'table',
    properties,
    h('caption', {}, title),
    h('thead', {}, h('tr', {}, ...columns)),
    h('tbody', {}, ...limits.map(reading)),
  );
}

/** A cleaned component as HTML nodes. Hold points and cautions have their own place on the sheet and leave none here. */
export function componentNodes(element: Element, head: Frontmatter, opensSentence: boolean): HastElement[] {
  const reference = referenceOf(element);
  if (!reference) return [];
  if (reference.kind === 'figure') return figure(reference.key, head);
  if (reference.kind === 'worksheet') return [worksheet(reference.worksheet, bindingsIn(given(element)['of']), head)];
  const text = valueOf(reference, head, opensSentence);
  return text ? [valueSpan(reference, text)] : [];
}
