import { parentPort } from 'node:worker_threads';
import { parseProcedure } from '@/domain/procedure/parse';
import { READY } from './parseThread';

/** The thread in which foreign text is parsed, so that no text can hold up the server. One question, one answer. */
parentPort?.on('message', (source: string) => {
  parentPort?.postMessage(parseProcedure(source));
});
parentPort?.postMessage(READY);
