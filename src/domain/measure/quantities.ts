/**
 * Which units a limit may be written in, by quantity. `finding` is a plain observation without a number.
 * Conversions live in `units.ts`; this table is only the vocabulary, so that the schema stays light.
 */
export const UNITS_BY_QUANTITY = {
  length: ['mm', 'µm', 'in', 'thou'],
  angle: ['°'],
  torque: ['N·m', 'lbf·ft', 'lbf·in', 'kgf·m'],
  force: ['N', 'kN', 'lbf'],
  pressure: ['kPa', 'bar', 'psi', 'MPa'],
  temperature: ['°C', '°F'],
  volume: ['mL', 'L', 'cm³', 'US qt', 'imp qt'],
  flow: ['cc/min', 'mL/min', 'L/min', 'lb/h', 'g/s'],
  speed: ['rpm'],
  time: ['s', 'min', 'h'],
  voltage: ['V', 'mV'],
  current: ['A'],
  resistance: ['Ω', 'kΩ'],
  mass: ['g', 'kg'],
  share: ['%'],
  ratio: [':1'],
  count: ['turns', 'places', 'drops'],
} as const;

export type MeasuredQuantity = keyof typeof UNITS_BY_QUANTITY;
export type Quantity = MeasuredQuantity | 'finding';
export const QUANTITIES = [...Object.keys(UNITS_BY_QUANTITY), 'finding'] as unknown as [Quantity, ...Quantity[]];
