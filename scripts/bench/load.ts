import { createServer, type Server } from 'node:http';
import type { AddressInfo } from 'node:net';
import { mkdtempSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import autocannon from 'autocannon';
import sirv from 'sirv';

/** Requests a second at 20 connections; a run with any error or unexpected status is no measurement. */
export async function load(
  url: string,
  headers: Record<string, string> = {},
  expected = 200,
  seconds = 6,
): Promise<number> {
  const options = { url, headers, connections: 20, duration: seconds };
  await autocannon({ ...options, duration: 2 });
  const result = await autocannon(options);
  const wanted = result.statusCodeStats?.[`${expected}`]?.count ?? 0;
  if (result.errors > 0 || result.timeouts > 0 || wanted < result.requests.total * 0.999)
    throw new Error(`${url} did not answer ${expected} throughout: ${JSON.stringify(result.statusCodeStats)}`);
  return result.requests.average;
}

async function listen(server: Server): Promise<string> {
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
  return `http://127.0.0.1:${(server.address() as AddressInfo).port}`;
}

/** A bare Node server and sirv, both sending exactly these bytes: what the page is measured against. */
export async function references(body: Buffer): Promise<{ bare: string; sirv: string; close: () => void }> {
  const folder = mkdtempSync(join(tmpdir(), 'matchmark-bench-'));
  writeFileSync(join(folder, 'page.html'), body);
  const serve = sirv(folder, { etag: true });
  const bare = createServer((_req, res) => {
    res.writeHead(200, { 'content-type': 'text/html; charset=utf-8', 'content-length': body.length });
    res.end(body);
  });
  const files = createServer((req, res) => serve(req, res));
  return {
    bare: await listen(bare),
    sirv: `${await listen(files)}/page.html`,
    close: () => {
      bare.closeAllConnections();
      files.closeAllConnections();
      bare.close();
      files.close();
    },
  };
}
