/** Buttons that copy an address of this site; without a script they are not offered, and the link beside them is the address. */
const BACK_AFTER = 2500;

for (const button of document.querySelectorAll<HTMLButtonElement>('button[data-copy]'))
  button.addEventListener('click', () => {
    const said = document.querySelector('[data-said]');
    const address = new URL(button.dataset['copy'] ?? '', location.origin).href;
    const say = (words: string) => {
      if (said) said.textContent = words;
      setTimeout(() => said && (said.textContent = ''), BACK_AFTER);
    };
    navigator.clipboard?.writeText(address).then(
      () => say('Link copied'),
      () => say(address),
    ) ?? say(address);
  });
