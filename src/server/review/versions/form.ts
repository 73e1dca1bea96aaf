import type { Actor } from '@/domain/people/may';
import { textOf } from '../../http/form';
import { malformed, notFound, Refusal } from '../../refusal';
import { restoreVersion } from './restore';

/** The number in the address of a version. Refuses 404 what is no number. */
export function versionNumber(text: string | undefined): number {
  if (!text || !/^\d{1,9}$/.test(text)) throw notFound();
  return Number(text);
}

/** Goes back to a version from the form of its page. What a look at the draft can put right comes back in words. */
export async function restorePlainly(
  actor: Actor,
  id: string,
  n: number,
  form: FormData,
): Promise<'done' | { status: number; detail: string }> {
  const version = textOf(form, 'version');
  if (!/^\d{1,9}$/.test(version))
    throw malformed('The form came without some of its fields. Go back and send it again.');
  try {
    await restoreVersion(actor, id, n, Number(version));
    return 'done';
  } catch (error) {
    if (!(error instanceof Refusal) || error.status !== 409) throw error;
    const detail =
      error.type === '/problems/stale'
        ? 'The draft was changed after this page was opened. Nothing was overwritten: below it is compared as it stands now.'
        : error.detail;
    return { status: 409, detail };
  }
}
