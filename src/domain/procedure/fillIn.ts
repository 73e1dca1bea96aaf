/**
 * Marks a place that a template, an import or the empty sheet leaves to its author: "Fill in: which screws". Plain
 * words, so that they read in every view of the draft; a text that still holds one is not sent in.
 */
export const FILL_IN = 'Fill in:';

/** Stands under `engines`, where a text must name at least one, until the author has chosen. */
export const ENGINE_TO_FILL_IN = 'fill-in';

export const fillIn = (what: string): string => `${FILL_IN} ${what}`;
