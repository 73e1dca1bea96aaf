/**
 * A sheet that stays open may be superseded or withdrawn meanwhile. It asks when somebody comes back to it, when the network
 * returns, and every minute while it is in sight, and says so at once; without network it stays as it is.
 */

const EVERY = 60_000;
/** Coming back sooner than this asks nothing: the sheet was just read. */
const FRESH = 10_000;

const notice = document.querySelector<HTMLElement>('[data-newer]');
const since = document.querySelector<HTMLElement>('[data-withdrawn-since]');
let asked = Date.now();

interface Withdrawal {
  reason: string;
  by: { name: string };
}

/** Says in the notice, in the title block and on every printed page that this revision is no longer the current one. */
function tell(shown: HTMLElement, number: string, letter: string, now: string): void {
  for (const place of shown.querySelectorAll('[data-letter-now]')) place.textContent = now;
  shown
    .querySelector('[data-what-changed]')
    ?.setAttribute('href', `/procedures/${number}/compare?from=${letter}&to=${now}`);
  for (const place of document.querySelectorAll('[data-standing]')) place.textContent = 'superseded';
  for (const place of document.querySelectorAll('[data-strip-revision]')) place.textContent = `${letter}, superseded`;
  shown.hidden = false;
}

/** Says the same of a sheet that was withdrawn. */
function tellWithdrawn(shown: HTMLElement, letter: string, { reason, by }: Withdrawal): void {
  for (const place of shown.querySelectorAll('[data-withdrawn-why]')) place.textContent = reason;
  for (const place of shown.querySelectorAll('[data-withdrawn-by]')) place.textContent = by.name;
  for (const place of document.querySelectorAll('[data-standing]')) place.textContent = 'withdrawn';
  for (const place of document.querySelectorAll('[data-strip-revision]')) place.textContent = `${letter}, withdrawn`;
  for (const place of document.querySelectorAll<HTMLElement>('[data-strip-name]')) {
    place.textContent = 'Withdrawn. Do not work from this sheet.';
    place.dataset['stripName'] = 'withdrawn';
  }
  shown.hidden = false;
}

async function ask(): Promise<void> {
  if (!notice?.hidden || !since?.hidden) return;
  asked = Date.now();
  const { number = '', letter = '' } = notice.dataset;
  const answer = await fetch(`/api/v1/procedures/${number}`, { cache: 'no-cache' }).catch(() => undefined);
  if (!answer?.ok) return;
  const { revision, withdrawn } = (await answer.json()) as {
    revision: { letter: string };
    withdrawn: Withdrawal | null;
  };
  if (withdrawn) tellWithdrawn(since, letter, withdrawn);
  else if (revision.letter !== letter) tell(notice, number, letter, revision.letter);
}

const cameBack = (event: PageTransitionEvent) => {
  const [entry] = performance.getEntriesByType('navigation') as PerformanceNavigationTiming[];
  return event.persisted || entry?.type === 'back_forward';
};

if (notice) {
  window.addEventListener('pageshow', (event) => {
    if (cameBack(event)) void ask();
  });
  window.addEventListener('online', () => void ask());
  document.addEventListener('visibilitychange', () => {
    if (document.visibilityState === 'visible' && Date.now() - asked > FRESH) void ask();
  });
  setInterval(() => {
    if (document.visibilityState === 'visible') void ask();
  }, EVERY);
}
