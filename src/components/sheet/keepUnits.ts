/** The units that are still to be kept, where a switch came while the one before it was on its way. */
let waiting: string | null = null;
let sending = false;

const post = (units: string) =>
  fetch('/profile/units', {
    method: 'POST',
    body: new URLSearchParams({ units }),
    redirect: 'manual',
    keepalive: true,
  }).catch(() => {});

async function send(units: string): Promise<void> {
  sending = true;
  await post(units);
  sending = false;
  const next = waiting;
  waiting = null;
  if (next) void send(next);
}

/**
 * Shows the page in a reader's units and keeps them in the profile, one after the other: two switches in a row must not
 * overtake each other. It outlives the page, for whoever switches and goes on at once; where it fails the page still
 * shows them, and the next one asks again.
 */
export function keepUnits(units: string): void {
  document.documentElement.dataset['units'] = units;
  if (!sending) void send(units);
  else {
    if (waiting === null) addEventListener('pagehide', () => waiting && void post(waiting), { once: true });
    waiting = units;
  }
}
