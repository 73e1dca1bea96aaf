import type { Unit } from './convert';

/** How people write units and numbers, for the search field and for the boxes of a worksheet alike. */

const dot = String.raw`[\s.·⋅•*x-]*`;
const force = '(?:lbf|lbs?|pounds?|pound-force)';
const foot = '(?:ft|foot|feet)';
const inch = '(?:in|inch|inches)';

/** Spellings of a unit, the longest and least mistakable first. Matched after a number, whatever the case. */
export const SPELLINGS: readonly (readonly [pattern: string, unit: Unit, times?: number])[] = [
  [`${force}${dot}${foot}|${foot}${dot}${force}`, 'lbf·ft'],
  [`${force}${dot}${inch}|${inch}${dot}${force}`, 'lbf·in'],
  [`kgf?${dot}cm`, 'kgf·m', 0.01],
  [`kgf?${dot}m|kpm|m${dot}kgf?`, 'kgf·m'],
  [`dan${dot}m`, 'N·m', 10],
  [`n${dot}m|newton[\\s-]?met(?:re|er)s?`, 'N·m'],
  [`cc${dot}/${dot}min|cc per min(?:ute)?`, 'cc/min'],
  ['ml ?/ ?min|ml per min(?:ute)?', 'mL/min'],
  ['l ?/ ?min|lit(?:re|er)s? per min(?:ute)?', 'L/min'],
  ['lbs? ?/ ?(?:h|hr|hour)|pph', 'lb/h'],
  ['g ?/ ?s', 'g/s'],
  ['kpa', 'kPa'],
  ['mpa', 'MPa'],
  ['bars?', 'bar'],
  ['psig?|lbf? ?/ ?in(?:2|²)', 'psi'],
  ['°? ?c(?:elsius)?|deg(?:rees?)? ?c', '°C'],
  ['°? ?f(?:ahrenheit)?|deg(?:rees?)? ?f', '°F'],
  ['°|deg(?:rees?)?', '°'],
  ['thous?|thousandths?|mils?', 'thou'],
  ['mm|millimet(?:re|er)s?', 'mm'],
  ['[µμu]m|microns?|micromet(?:re|er)s?', 'µm'],
  ['cm', 'mm', 10],
  [`${inch}|"|″|''`, 'in'],
  ['us (?:qts?|quarts?)', 'US qt'],
  ['imp(?:erial)? (?:qts?|quarts?)', 'imp qt'],
  ['qts?|quarts?', 'US qt'],
  ['ml|millilit(?:re|er)s?', 'mL'],
  ['cc|cm3|cm³', 'cm³'],
  ['l|lit(?:re|er)s?|ltrs?', 'L'],
  ['rpm|r/min|revs?', 'rpm'],
  ['mv|millivolts?', 'mV'],
  ['v|volts?', 'V'],
  ['kohms?|k(?:Ω|ω)', 'kΩ'],
  ['ohms?|Ω|ω', 'Ω'],
  ['amps?|a', 'A'],
  ['kn', 'kN'],
  ['n|newtons?', 'N'],
  [force, 'lbf'],
  // In a box for a mass; anywhere else a pound is a force.
  ['lbs?|pounds?', 'lb'],
  ['kgs?|kilos?', 'kg'],
  ['g|grams?', 'g'],
  ['h|hrs?|hours?', 'h'],
  ['mins?|minutes?', 'min'],
  ['s|secs?|seconds?', 's'],
  ['%|per ?cent', '%'],
];

/** Units that only a box of a worksheet takes; in the search field these are words like any other. */
export const WORKSHEET_SPELLINGS: typeof SPELLINGS = [
  ['kw|kilowatts?', 'kW'],
  ['b?hp|horse ?power', 'hp'],
  [`g ?/ ?(?:kw${dot}h|\\(kw${dot}h\\))`, 'g/kWh'],
  [`lbs? ?/ ?(?:hp${dot}h|\\(hp${dot}h\\))`, 'lb/hp·h'],
  ['kg ?/ ?m(?:3|³)|kg per m(?:3|³)', 'kg/m³'],
  ['g ?/ ?(?:cc|cm3|cm³|ml)|kg ?/ ?(?:l|dm3|dm³)', 'g/cm³'],
  ['mm(?:2|²) ?/ ?s|cst|centistokes?', 'mm²/s'],
];

/** A number as people type it: a point or a comma before the decimals, thin or ordinary spaces between groups of three. */
export const NUMBER = String.raw`\d{1,3}(?:[\u202f\u2009' ]\d{3})+(?!\d)(?:[.,]\d+)?|\d+(?:[.,]\d+)?|[.,]\d+`;

export const numberOf = (text: string): number => Number(text.replace(/[\u202f\u2009' ]/g, '').replace(',', '.'));
