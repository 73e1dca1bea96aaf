export const groups = [
  { title: 'Readings', fields: ['cylinders', 'layout', 'scale', 'air', 'altitude'] },
  { title: 'Limits', fields: ['compression', 'nominal', 'share'] },
  { title: 'Rules', fields: ['rule', 'leastShare', 'mostBelow', 'mostDifference', 'rise'] },
] as const;

export const example = {
  'cylinders.0.dry': '1280',
  'cylinders.1.dry': '1300',
  'cylinders.2.dry': '930',
  'cylinders.2.wet': '950',
  'cylinders.3.dry': '1260',
  'compression.min': '1050',
  nominal: '1300',
  'share.min': '75',
};
