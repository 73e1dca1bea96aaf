import type { Element, ElementContent, Nodes } from 'hast';

/** The inline style of an element: values in small letters by property. */
export function styleOf(element: Element): Readonly<Record<string, string>> {
  const text = element.properties['style'];
  if (typeof text !== 'string') return {};
  return Object.fromEntries(
    text.split(';').flatMap((rule) => {
      const colon = rule.indexOf(':');
      return colon < 0
        ? []
        : [
            [
              rule.slice(0, colon).trim().toLowerCase(),
              rule
                .slice(colon + 1)
                .trim()
                .toLowerCase(),
            ],
          ];
    }),
  );
}

export const attributeOf = (element: Element, name: string): string => {
  const value = element.properties[name];
  return typeof value === 'string' || typeof value === 'number' ? String(value) : '';
};

export const classesOf = (element: Element): string => {
  const value = element.properties['className'];
  return Array.isArray(value) ? value.join(' ') : '';
};

/** Whether words are set apart by weight; null where the element says nothing of it. */
export function boldOf(element: Element): boolean | null {
  const weight = styleOf(element)['font-weight'];
  if (weight) {
    if (/^\d/.test(weight)) return Number.parseInt(weight, 10) >= 600;
    if (/^bold/.test(weight)) return true;
    if (weight === 'normal' || weight === 'lighter') return false;
  }
  return element.tagName === 'b' || element.tagName === 'strong' ? true : null;
}

export function italicOf(element: Element): boolean | null {
  const style = styleOf(element)['font-style'];
  if (style) return style.startsWith('italic') || style.startsWith('oblique');
  return element.tagName === 'i' || element.tagName === 'em' ? true : null;
}

/** Whether words are raised or lowered; online documents say it by style alone. */
export function shiftOf(element: Element): 'sup' | 'sub' | null {
  const align = styleOf(element)['vertical-align'];
  if (align === 'super' || element.tagName === 'sup') return 'sup';
  return align === 'sub' || element.tagName === 'sub' ? 'sub' : null;
}

/** Words that their author took away again and that must not come in as if they held. */
export const isStruck = (element: Element): boolean =>
  ['s', 'del', 'strike'].includes(element.tagName) ||
  /line-through/.test(`${styleOf(element)['text-decoration'] ?? ''} ${styleOf(element)['text-decoration-line'] ?? ''}`);

export function isHidden(element: Element): boolean {
  const style = styleOf(element);
  return style['display'] === 'none' || style['mso-hide'] === 'all' || style['mso-list'] === 'ignore';
}

export const isElement = (node: Nodes | undefined): node is Element => node?.type === 'element';

/** All words inside, whatever stands around them. */
export const plainOf = (nodes: readonly ElementContent[]): string =>
  nodes.map((node) => (node.type === 'text' ? node.value : isElement(node) ? plainOf(node.children) : '')).join('');
