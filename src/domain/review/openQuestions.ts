/**
 * Why open questions hold publishing up: "A question on step 4, Fit the cover, is still open." Null without any.
 *
 * @param places what each of them is tied to, in words
 */
export function openQuestionWords(places: readonly string[]): string | null {
  const [first, ...others] = places;
  if (first === undefined) return null;
  if (others.length === 0) return `A question on ${first} is still open. It must be answered and resolved first.`;
  const most = places.slice(0, 3);
  const rest = places.length - most.length;
  const named = [...most, ...(rest > 0 ? [`${rest} more`] : [])];
  return `${places.length} questions are still open: on ${named.join('; on ').replace(/; on (\d+ more)$/, '; and $1')}. They must be answered and resolved first.`;
}
