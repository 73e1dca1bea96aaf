export const groups = [
  { title: 'Fastener', fields: ['thread', 'pitch', 'propertyClass', 'condition'] },
  { title: 'Torque', fields: ['torque', 'angle', 'before', 'low'] },
] as const;

export const example = { thread: 'M8', pitch: '1.25 mm', propertyClass: '8.8', condition: 'dry', torque: '22 N·m' };
