import { forgetAll } from '@/components/search/kept';
import { singleKey } from '@/components/ui/singleKeys';

/** What the frame of every page does beyond HTML. Nothing here is needed to read, search or save. */

// "/" goes to search from anywhere; the look-up page's own field carries the mark too.
document.addEventListener('keydown', (event) => {
  if (singleKey(event) === '/') {
    const find = document.querySelector<HTMLInputElement>('[data-find]');
    if (find) {
      event.preventDefault();
      find.focus();
      find.select();
    }
  }
  if (event.key === 'Escape')
    for (const menu of document.querySelectorAll<HTMLDetailsElement>('details[data-menu][open]')) {
      menu.open = false;
      menu.querySelector('summary')?.focus();
    }
});

document.addEventListener('click', (event) => {
  for (const menu of document.querySelectorAll<HTMLDetailsElement>('details[data-menu][open]'))
    if (event.target instanceof Node && !menu.contains(event.target)) menu.open = false;
});

// The pressed button answers at once, and a second press sends nothing twice.
document.addEventListener('submit', (event) => {
  const form = event.target;
  if (event.defaultPrevented || !(form instanceof HTMLFormElement) || form.method !== 'post') return;
  if (form.dataset.sent !== undefined) {
    event.preventDefault();
    return;
  }
  form.dataset.sent = '';
  const everywhere = form.querySelector('input[name="section"][value="sessions"]');
  if (everywhere || new URL(form.action).pathname === '/sign-out') forgetAll();
  event.submitter?.setAttribute('data-pending', '');
});
addEventListener('pageshow', (event) => {
  if (!event.persisted) return;
  for (const form of document.forms) delete form.dataset.sent;
  for (const button of document.querySelectorAll('[data-pending]')) button.removeAttribute('data-pending');
});

const offline = document.querySelector<HTMLElement>('[data-offline]');
const sayNetwork = () => offline?.toggleAttribute('hidden', navigator.onLine);
addEventListener('online', sayNetwork);
addEventListener('offline', sayNetwork);
sayNetwork();
