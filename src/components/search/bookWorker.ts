import { type PackedBook, unpackBook } from '@/domain/search/columns';
import { createSearch, type Search } from '@/domain/search/engine';
import { INDEX_CACHE } from './kept';
import type { FromWorker, ToWorker } from './workerMessages';

/** The search of the page, beside its main thread: making the index of a large book takes seconds, typing must not wait. */

const worker = globalThis as unknown as {
  onmessage: ((event: MessageEvent<ToWorker>) => void) | null;
  postMessage(message: FromWorker): void;
};

let search: Search | null = null;
let etag: string | null = null;

const say = (message: FromWorker): void => {
  worker.postMessage(message);
};

const openCache = (): Promise<Cache | null> =>
  'caches' in globalThis ? caches.open(INDEX_CACHE).catch(() => null) : Promise.resolve(null);

/** From the network, which answers 304 out of the browser's own cache where nothing changed; without it, what was kept. */
async function fetchIndex(person: string): Promise<Response> {
  const cache = await openCache();
  const key = `/api/v1/search-index?person=${encodeURIComponent(person)}`;
  let answer: Response;
  try {
    answer = await fetch('/api/v1/search-index', { cache: 'no-cache', credentials: 'same-origin' });
  } catch (offline) {
    const kept = await cache?.match(key);
    if (kept) return kept;
    throw offline;
  }
  if (answer.status === 401) await cache?.delete(key);
  if (!answer.ok) throw new Error(`The index answered ${answer.status}.`);
  const kept = await cache?.match(key);
  if (kept?.headers.get('etag') !== answer.headers.get('etag')) await cache?.put(key, answer.clone()).catch(() => null);
  return answer;
}

/**
 * Asked once before anybody types, in the worker's own time: the first run of any code is several times slower than the
 * next, and it would be the first letters of a search that wait for it.
 */
const FIRST_ASKED = [
  'c',
  'co',
  'cover b',
  'cover bolt',
  '10 n',
  '10 n·m',
  '0.3 mm gap',
  'injecter',
  'p-0',
  'timing chain t',
];

async function load(person: string): Promise<void> {
  const answer = await fetchIndex(person);
  const tag = answer.headers.get('etag');
  if (search && tag !== null && tag === etag) return;
  search = createSearch(unpackBook((await answer.json()) as PackedBook));
  etag = tag;
  for (const text of FIRST_ASKED) search.query(text);
}

worker.onmessage = ({ data }) => {
  if (data.kind === 'load')
    load(data.person).then(
      () => say({ id: data.id, ok: true, value: etag }),
      (error: unknown) => say({ id: data.id, ok: false, why: String(error) }),
    );
  else if (search) {
    const { text, filters, limit, units, inProse } = data;
    say({ id: data.id, ok: true, value: search.query(text, filters, { limit, units, inProse: new Map(inProse) }) });
  } else say({ id: data.id, ok: false, why: 'The index is not loaded.' });
};
