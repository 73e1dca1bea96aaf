const typing = (target: EventTarget | null) =>
  target instanceof HTMLElement && (target.isContentEditable || /^(INPUT|TEXTAREA|SELECT)$/.test(target.tagName));

/**
 * The key, where it was pressed alone, outside of a field, by somebody who lets single keys act; null otherwise. People
 * who speak to their computer, or whose hands are not sure of a key, switch them off in their profile (WCAG 2.2,
 * success criterion 2.1.4). Every single-key shortcut asks here.
 */
export function singleKey(event: KeyboardEvent): string | null {
  if (document.documentElement.dataset['shortcuts'] === 'off') return null;
  if (event.ctrlKey || event.metaKey || event.altKey || event.isComposing || typing(event.target)) return null;
  return event.key;
}
