export const groups = [
  { title: 'Readings', fields: ['bearings'] },
  { title: 'Limits', fields: ['clearance', 'bore', 'journal'] },
  { title: 'End play', fields: ['forward', 'back', 'play'] },
] as const;

export const example = {
  'bearings.0.bore': '52.022',
  'bearings.0.journal': '51.990',
  'bearings.1.bore': '52.024',
  'bearings.1.journal': '51.988',
  'bearings.2.bore': '52.028',
  'bearings.2.journal': '51.978',
  'clearance.min': '0.022',
  'clearance.max': '0.048',
  'bore.min': '52.016',
  'bore.max': '52.03',
  'journal.min': '51.982',
  'journal.max': '51.994',
  forward: '0.12',
  back: '-0.01',
  'play.min': '0.06',
  'play.max': '0.20',
};
