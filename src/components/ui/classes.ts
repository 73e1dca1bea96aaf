/** Joins class names, leaving out what does not apply. */
export const classes = (...names: (string | false | null | undefined)[]): string => names.filter(Boolean).join(' ');
