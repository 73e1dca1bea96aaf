export const groups = [
  { title: 'Bar and gauge', fields: ['bar', 'from', 'zero', 'direction'] },
  { title: 'Readings', fields: ['reading', 'facing'] },
  { title: 'Limits', fields: ['distance', 'facingDistance', 'total', 'thickness'] },
] as const;

export const example = {
  bar: '25.40',
  reading: '38.4',
  facing: '53.4',
  'distance.min': '12',
  'distance.max': '14',
  'facingDistance.min': '24',
  'facingDistance.max': '32',
  'total.min': '36',
  'total.max': '46',
};
