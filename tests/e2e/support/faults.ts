import type { BrowserContext } from '@playwright/test';

/** What a browser did that no page of ours may do; a test that provokes an error on purpose names it in `allow`. */
export interface Faults {
  list: string[];
  allow: RegExp[];
}

/**
 * Notes every request to another host, every uncaught error and every error in the console, in all pages of a
 * browser. `host` is ours, with its port.
 */
export function watchFaults(context: BrowserContext, host: string): Faults {
  const faults: Faults = { list: [], allow: [] };
  context.on('request', (request) => {
    const { protocol, host: asked, href } = new URL(request.url());
    if (!['data:', 'blob:', 'about:'].includes(protocol) && asked !== host)
      faults.list.push(`Asked another host: ${href}`);
  });
  context.on('weberror', (error) => faults.list.push(`Uncaught: ${error.error().message} (${error.page()?.url()})`));
  context.on('console', (message) => {
    if (message.type() === 'error') faults.list.push(`Console: ${message.text()} (${message.location().url})`);
  });
  return faults;
}

export const unexpected = ({ list, allow }: Faults): string[] =>
  list.filter((fault) => !allow.some((pattern) => pattern.test(fault)));
