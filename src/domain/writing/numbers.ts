/**
 * A number as people type it: decimal comma or point, a minus of either kind. Anything else stays the text
 * that was typed, so that the check can say what is wrong with it and nothing is lost.
 */
export function readNumber(text: string): number | string {
  const typed = text.trim();
  if (!/^[+\-−]?(\d+([.,]\d*)?|[.,]\d+)$/.test(typed)) return typed;
  const value = Number(typed.replace('−', '-').replace(',', '.'));
  return Number.isFinite(value) ? value + 0 : typed;
}

/** Numbers with blanks, semicolons or line ends between; a comma followed by a blank divides too. */
export const readNumbers = (text: string): (number | string)[] =>
  text
    .split(/[\s;]+|,(?=\s|$)/)
    .map((piece) => piece.replace(/,$/, ''))
    .filter(Boolean)
    .map(readNumber);
