import { faultSentence } from '@/domain/audit/fault';
import { checkBook } from './check';

const day = (iso: string) => iso.slice(0, 10);
/** A long list tells no more than its head. */
const TOLD = 20;

/** Checks the whole trail while the book is in use. What is wrong is said in the log; nothing is stopped by it. */
export async function checkAtStart(): Promise<void> {
  try {
    const { faults } = await checkBook();
    for (const fault of faults.slice(0, TOLD))
      console.warn(`audit: ${fault.table} ${fault.id}: ${faultSentence(fault, day)}`);
    if (faults.length > 0)
      console.warn(
        `audit: the trail does not hold (${faults.length} found). Keep a copy of the data folder as it is, then run npm run audit:check.`,
      );
  } catch (error) {
    console.error('audit: the trail could not be checked', error);
  }
}
