export const groups = [{ title: 'Number', fields: ['vin'] }] as const;

/** The worked example of the NHTSA, Outline for New Manufacturer Information, p. 18. */
export const example = { vin: '1J9RP1A36A1644345' };
