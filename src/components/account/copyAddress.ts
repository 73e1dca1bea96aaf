/** Puts the address that is shown once on the clipboard, and says so; where the browser forbids it, marks it for copying. */
document.addEventListener('click', (event) => {
  const button = event.target instanceof Element ? event.target.closest('[data-copy]') : null;
  const notice = button?.closest('form');
  const field = notice?.querySelector<HTMLInputElement>('[data-copied-from]');
  const said = notice?.querySelector('[data-copy-said]');
  if (!field || !said) return;
  field.select();
  // Over plain http there is no clipboard at all.
  const clipboard = navigator.clipboard as Clipboard | undefined;
  const copied = clipboard?.writeText(field.value) ?? Promise.reject(new Error('no clipboard'));
  copied.then(
    () => (said.textContent = 'Copied'),
    () => (said.textContent = 'Marked; copy it with Ctrl+C or ⌘C.'),
  );
});
