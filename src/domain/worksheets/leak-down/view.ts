export const groups = [
  { title: 'Readings', fields: ['supply', 'cylinders'] },
  { title: 'Limits', fields: ['loss', 'supplied', 'suspect'] },
  { title: 'Tester', fields: ['bore'] },
] as const;

export const example = {
  supply: '550',
  'cylinders.0.pressure': '510',
  'cylinders.0.heard': 'crankcase',
  'cylinders.1.pressure': '515',
  'cylinders.2.pressure': '400',
  'cylinders.2.heard': 'exhaust',
  'cylinders.3.pressure': '505',
  'loss.max': '15',
};
