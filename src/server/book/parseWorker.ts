import { parentPort } from 'node:worker_threads';
import { parseProcedure } from '@/domain/procedure/parse';
import { READY } from './parseThread';

/** The thread in which foreign text is parsed, so that no text can hold up the server. One question, one answer. */
parentPort?.on('message', (source: string) => {
  parentPort?.postMessage(parseProcedure(source));
});

/**
 * Read before the first text, so that loading and compiling the parser does not count against that
 * text's time on a busy machine. It is not in canonical form, which makes the parser go all its ways.
 */
const WARM_UP = `---
title: Warm up
summary: Read once when the thread starts.
system: checks
engines: [none]
minutes: 1
skill: apprentice
limits: [{ key: gap, name: Gap, quantity: length, unit: mm, max: 1 }]
---
Words, *words* and [words](/).

<Step id="one" title="One">
1. Read <Limit of="gap" />

| a | b |
|---|---|
| 1 | 2 |

> <Limit of="gap" />

<Worksheet kind="readings" of="gap" />
</Step>
`;
for (let i = 0; i < 10; i += 1) parseProcedure(WARM_UP);
parentPort?.postMessage(READY);
