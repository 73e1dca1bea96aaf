export const groups = [
  { title: 'Straightedge and feeler gauge', fields: ['gaps'] },
  { title: 'Limits', fields: ['every', 'along', 'across', 'diagonal', 'local', 'over', 'whole'] },
  { title: 'Surface plate and dial', fields: ['points'] },
] as const;

export const example = {
  'gaps.0.direction': 'along',
  'gaps.0.gap': '0.03',
  'gaps.1.direction': 'along',
  'gaps.1.gap': '0.04',
  'gaps.2.direction': 'diagonal',
  'gaps.2.gap': '0.04',
  'gaps.3.direction': 'diagonal',
  'gaps.3.gap': '0.06',
  'gaps.4.direction': 'across',
  'gaps.4.gap': '0.02',
  'every.max': '0.05',
  'across.max': '0.03',
};
