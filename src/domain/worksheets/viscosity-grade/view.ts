export const groups = [{ title: 'Oil', fields: ['viscosity', 'grade'] }] as const;

export const example = { viscosity: '10.4', grade: '30' };
