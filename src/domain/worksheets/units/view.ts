export const groups = [{ title: 'What you have', fields: ['measure', 'density'] }] as const;

export const example = { measure: '89 lbf·in' };
