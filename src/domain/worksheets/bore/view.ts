export const groups = [
  { title: 'Readings', fields: ['heights', 'nominal', 'piston'] },
  { title: 'Limits', fields: ['diameter', 'taperRule', 'taper', 'roundness', 'clearance'] },
] as const;

export const example = {
  'heights.0.thrust': '82.012',
  'heights.0.along': '82.006',
  'heights.1.thrust': '82.010',
  'heights.1.along': '82.006',
  'heights.2.thrust': '82.004',
  'heights.2.along': '82.002',
  nominal: '82',
  piston: '81.970',
  'diameter.min': '82',
  'diameter.max': '82.02',
  'taper.max': '0.015',
  'roundness.max': '0.012',
  'clearance.min': '0.025',
  'clearance.max': '0.055',
};
