/**
 * Shows the page in a reader's units and keeps them in the profile. It outlives the page, for whoever switches and goes on
 * at once; where it fails the page still shows them, and the next one asks again.
 */
export function keepUnits(units: string): void {
  document.documentElement.dataset['units'] = units;
  const body = new URLSearchParams({ units });
  void fetch('/profile/units', { method: 'POST', body, redirect: 'manual', keepalive: true }).catch(() => {});
}
