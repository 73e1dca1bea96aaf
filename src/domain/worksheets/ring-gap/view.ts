export const groups = [
  { title: 'Readings', fields: ['cylinders'] },
  { title: 'Limits', fields: ['top', 'second', 'rail'] },
  { title: 'By the bore', fields: ['bore', 'factor', 'measuredIn'] },
] as const;

export const example = {
  'cylinders.0.top': '0.31',
  'cylinders.0.second': '0.46',
  'cylinders.1.top': '0.29',
  'cylinders.1.second': '0.48',
  'cylinders.2.top': '0.21',
  'cylinders.2.second': '0.45',
  'cylinders.3.top': '0.30',
  'cylinders.3.second': '0.47',
  'top.min': '0.25',
  'top.max': '0.40',
  'second.min': '0.40',
  'second.max': '0.55',
};
