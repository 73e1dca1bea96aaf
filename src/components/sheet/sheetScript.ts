import { keepUnits } from './keepUnits';
import { stepThrough } from './orderSteps';

/** A sheet's small comforts: units in place, links to steps, print. Each works as a plain link or form without it. */

for (const form of document.querySelectorAll<HTMLFormElement>('form[data-units-switch]'))
  form.addEventListener('submit', (event) => {
    const pressed = event.submitter;
    if (!(pressed instanceof HTMLButtonElement)) return;
    event.preventDefault();
    const units = pressed.value;
    keepUnits(units);
    for (const button of form.querySelectorAll('button'))
      button.setAttribute('aria-pressed', String(button.value === units));
  });

for (const link of document.querySelectorAll<HTMLAnchorElement>('a[data-copy-link]'))
  link.addEventListener('click', () => {
    const said = document.querySelector('[data-said]');
    void navigator.clipboard
      ?.writeText(link.href)
      .then(() => {
        if (said) said.textContent = 'Link copied';
        setTimeout(() => said && (said.textContent = ''), 2500);
      })
      .catch(() => {});
  });

// The question about a withdrawal; without it the link goes to a page with the same form.
for (const link of document.querySelectorAll<HTMLElement>('[data-opens]'))
  link.addEventListener('click', (event) => {
    const dialog = document.getElementById(link.dataset['opens'] ?? '');
    if (!(dialog instanceof HTMLDialogElement)) return;
    event.preventDefault();
    dialog.showModal();
    dialog.querySelector('textarea')?.focus();
  });
for (const button of document.querySelectorAll('[data-closes]'))
  button.addEventListener('click', () => button.closest('dialog')?.close());

// A drawing in an island is the island's to bring to life.
for (const figure of document.querySelectorAll<HTMLElement>('figure[data-order]'))
  if (!figure.closest('astro-island')) stepThrough(figure);

for (const button of document.querySelectorAll('[data-print]')) button.addEventListener('click', () => print());
