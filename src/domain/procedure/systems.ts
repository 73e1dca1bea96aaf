/**
 * The words by which sheets are sorted. Apart from the schema, so that a page that only filters a list does not have to
 * load what checks a text.
 */

/** The part of the engine a procedure works on. Order is the order of the filter on screen. */
export const SYSTEMS = {
  sealing: 'Sealing',
  lubrication: 'Lubrication',
  fuel: 'Fuel and injection',
  intake: 'Intake and breathing',
  cooling: 'Cooling',
  'valve-gear': 'Valve gear',
  timing: 'Timing drive',
  'cylinder-head': 'Cylinder head',
  'short-block': 'Crank, rods and pistons',
  electrical: 'Starting and glow',
  driveline: 'Flywheel and clutch',
  checks: 'Tests and running in',
} as const;
export type System = keyof typeof SYSTEMS;
/** The least skilled person the sheet is written for. */
export const SKILLS = ['apprentice', 'technician', 'senior'] as const;
