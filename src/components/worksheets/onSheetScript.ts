/**
 * Each table of a worksheet that can be worked out gets a button under it. The worksheet itself is fetched when the
 * button is pressed; without a script, or on paper, the table stays what it is: lines to write on.
 */
for (const table of document.querySelectorAll<HTMLElement>('[data-worksheet][data-bound]')) {
  const button = document.createElement('button');
  button.type = 'button';
  button.className = 'work-open';
  button.textContent = 'Work it out here';
  const place = document.createElement('div');
  place.hidden = true;
  table.after(button, place);
  button.addEventListener('click', async () => {
    if (button.dataset['pending'] !== undefined) return;
    button.dataset['pending'] = '';
    const loaded = await import('./open').catch(() => null);
    if (!loaded) {
      delete button.dataset['pending'];
      button.textContent = 'Could not be fetched. Try again';
      return;
    }
    const limits = JSON.parse(table.dataset['bound'] ?? '[]') as Parameters<typeof loaded.openWorksheet>[2];
    await loaded.openWorksheet(place, table.dataset['worksheet'] ?? '', limits, () => {
      place.hidden = true;
      button.hidden = false;
      button.focus();
    });
    delete button.dataset['pending'];
    button.textContent = 'Work it out here';
    button.hidden = true;
  });
}
