import type { SearchAnswer } from '@/domain/search/engine';
import type { Ask, FromWorker, ToWorker } from './workerMessages';

/** The page's side of the worker: each question gets the answer with its number. */
export interface Book {
  /** Fetches the index, or makes sure that it is the current one; answers its tag. */
  load(person: string): Promise<string | null>;
  ask(ask: Ask): Promise<SearchAnswer>;
}

type Message = ToWorker extends infer M ? (M extends ToWorker ? Omit<M, 'id'> : never) : never;

function openBook(): Book {
  const worker = new Worker(new URL('./bookWorker.ts', import.meta.url), { type: 'module' });
  const waiting = new Map<number, { resolve: (value: never) => void; reject: (why: Error) => void }>();
  let next = 0;
  worker.onmessage = ({ data }: MessageEvent<FromWorker>) => {
    const asked = waiting.get(data.id);
    waiting.delete(data.id);
    if (data.ok) asked?.resolve(data.value as never);
    else asked?.reject(new Error(data.why));
  };
  worker.onerror = () => {
    for (const { reject } of waiting.values()) reject(new Error('The search of this page stopped.'));
    waiting.clear();
  };
  const send = <T>(message: Message): Promise<T> =>
    new Promise<T>((resolve, reject) => {
      next += 1;
      waiting.set(next, { resolve: resolve as (value: never) => void, reject });
      worker.postMessage({ ...message, id: next });
    });
  return {
    load: (person) => send({ kind: 'load', person }),
    ask: (ask) => send({ kind: 'ask', ...ask }),
  };
}

let opened: Book | null = null;
/** One worker a page, started when it is first needed. */
export const theBook = (): Book => (opened ??= openBook());
