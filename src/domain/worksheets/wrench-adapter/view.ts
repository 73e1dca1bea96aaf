export const groups = [
  { title: 'Torque', fields: ['atBolt', 'step'] },
  { title: 'Wrench and adapter', fields: ['length', 'adapter', 'angle'] },
] as const;

/** TM 1-1500-204-23-9, figure 8-16: the published setting is 214 lbf·in. */
export const example = { atBolt: '300 lbf·in', length: '10 in', adapter: '4 in', angle: '0' };
