/** Buttons that copy an address of this site; without a script they are not offered, and the link beside them is the address. */
const BACK_AFTER = 2500;

/** Where nothing may be copied, the address itself is shown. */
const copied = async (address: string): Promise<string> => {
  try {
    await navigator.clipboard.writeText(address);
    return 'Link copied';
  } catch {
    return address;
  }
};

for (const button of document.querySelectorAll<HTMLButtonElement>('button[data-copy]'))
  button.addEventListener('click', async () => {
    const said = document.querySelector('[data-said]');
    const words = await copied(new URL(button.dataset['copy'] ?? '', location.origin).href);
    if (!said) return;
    said.textContent = words;
    setTimeout(() => (said.textContent = ''), BACK_AFTER);
  });
