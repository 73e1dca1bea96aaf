export const groups = [
  { title: 'What is measured', fields: ['tolerance'] },
  { title: 'What it is measured with', fields: ['resolution', 'uncertainty'] },
] as const;

export const example = { 'tolerance.min': '51.975 mm', 'tolerance.max': '52 mm', resolution: '0.01 mm' };
