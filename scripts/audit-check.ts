/**
 * Checks the audit trail and every row that it speaks of: `npm run audit:check`. Changes nothing in the book, and runs beside a running server too.
 * Ends with 1 where something does not hold, and names it. `--expect 214:1a2b3c4d` also holds the trail against a count
 * and a hash that were written down elsewhere; `--new-checkpoint`, after a backup was put back, takes it as it stands.
 */
import { parseArgs } from 'node:util';
import { faultSentence } from '@/domain/audit/fault';
import { checkBook } from '@/server/audit/check';
import { readConfig } from '@/server/config';
import { useApp } from '@/server/context';
import { openBook } from '@/server/start';

const { values: given } = parseArgs({
  options: { expect: { type: 'string' }, 'new-checkpoint': { type: 'boolean', default: false } },
});
const expect = given.expect === undefined ? null : /^(\d+):([0-9a-f]{8,64})$/.exec(given.expect);
if (given.expect !== undefined && !expect) {
  console.error('Give --expect as count:hash, for example --expect 214:1a2b3c4d, with 8 digits of the hash or more.');
  process.exit(2);
}

const running = await openBook(readConfig());
useApp(running);
try {
  const { entries, end, texts, faults, took } = await checkBook({
    ...(expect && { expected: { entries: Number(expect[1]), hash: expect[2] ?? '' } }),
    forgetCheckpoint: given['new-checkpoint'],
  });
  for (const fault of faults) {
    const about = [fault.number, fault.letter && `revision ${fault.letter}`].filter(Boolean).join(' ');
    console.log(
      `${fault.table} ${fault.id}${about && ` (${about})`}: ${faultSentence(fault, (iso) => iso.slice(0, 10))}`,
    );
  }
  console.log(`${entries} entries and ${texts} texts checked in ${(took / 1000).toFixed(1)} s.`);
  if (faults.length > 0) {
    console.log(
      `${faults.length} found that the trail does not bear out. Keep a copy of the data folder as it is now.`,
    );
    process.exitCode = 1;
  } else
    console.log(
      `The trail holds. Written down elsewhere, ${end.seq}:${end.hash} proves later that it was not cut or rewritten.`,
    );
} finally {
  await running.db.close();
}
