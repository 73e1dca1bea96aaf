/** Values that are written out in prose, where a component should stand. */

const NUMBER = String.raw`\d+(?:[.,]\d+)?`;
/** "in" is a unit only behind decimals: "0.012 in", but "turn bolt 4 in". */
const DECIMAL_INCHES = String.raw`(?<=\d[.,]\d+[\s\u00a0]?)in`;
/** "10 mm socket" names a tool, not a value to work to. */
const NAMES_A_TOOL = String.raw`(?![\s-]*(?:socket|spanner|wrench|hex|allen|drill|bit|punch|hose|key|ring|deep|nut|feeler))`;

const KINDS: readonly { units: string; component: string; list: string }[] = [
  {
    units: String.raw`N[·.⋅ ]?m|lbf?[·.⋅ -]?(?:ft|in)|(?:ft|in)[·.⋅ -]?lbf?s?|kgf?[·.⋅ ]?m`,
    component: 'Torque',
    list: 'torques',
  },
  {
    units: String.raw`${DECIMAL_INCHES}|mm|µm|μm|thou|cm|inch(?:es)?|kPa|MPa|bar|psi|°C|°F`,
    component: 'Limit',
    list: 'limits',
  },
  { units: String.raw`seconds?|minutes?|min|hours?|days?`, component: 'Timer', list: 'timers' },
];

const PATTERNS = KINDS.map(({ units, ...kind }) => ({
  ...kind,
  pattern: new RegExp(String.raw`(?<![\w.×/-])${NUMBER}[\s\u00a0-]?(?:${units})(?![\p{L}\d])${NAMES_A_TOOL}`, 'gu'),
}));

export interface ProseFigure {
  text: string;
  component: string;
  list: string;
}

/** Each figure with a unit in `prose`, with the component that should stand there, in no particular order. */
export function figuresInProse(prose: string): ProseFigure[] {
  return PATTERNS.flatMap(({ pattern, component, list }) =>
    [...prose.matchAll(pattern)].map(([text]) => ({ text, component, list })),
  );
}
