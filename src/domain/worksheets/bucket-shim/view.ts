export const groups = [
  { title: 'Readings', fields: ['valves'] },
  { title: 'Limits', fields: ['intake', 'intakeWanted', 'exhaust', 'exhaustWanted'] },
  { title: 'Stock', fields: ['stock', 'step'] },
] as const;

export const example = {
  'valves.0.side': 'intake',
  'valves.0.lash': '0.20',
  'valves.0.shim': '2.65',
  'valves.1.side': 'intake',
  'valves.1.lash': '0.12',
  'valves.1.shim': '2.70',
  'valves.2.side': 'exhaust',
  'valves.2.lash': '0.35',
  'valves.2.shim': '2.70',
  'valves.3.side': 'exhaust',
  'valves.3.lash': '0.28',
  'valves.3.shim': '2.60',
  intakeWanted: '0.20',
  exhaustWanted: '0.28',
  'intake.min': '0.17',
  'intake.max': '0.23',
  'exhaust.min': '0.25',
  'exhaust.max': '0.31',
  'stock.min': '2.20',
  'stock.max': '3.00',
};
