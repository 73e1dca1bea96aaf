import { parentPort } from 'node:worker_threads';
import type { Imported } from '@/domain/writing/import/importHowTo';
import { READY } from '../book/parseThread';
import { importAny, type ToImport } from './file';

const BROKE: Imported = {
  ok: false,
  message: 'This document cannot be read: it is nested too deeply, or damaged. Paste its text instead.',
};

/** The thread in which foreign documents are read, so that none can hold up the server. One question, one answer. */
parentPort?.on('message', (given: ToImport) => {
  importAny(given).then(
    (imported) => parentPort?.postMessage(imported),
    () => parentPort?.postMessage(BROKE),
  );
});

// Read before the first document, so that loading and compiling do not count against its time.
void importAny({ markdown: '# Warm up\n\nWords.\n\n1. One *step*\n\n| a |\n| - |\n| 1 |\n' }).then(() =>
  parentPort?.postMessage(READY),
);
