import type { PhotoChoice } from '@/domain/api/schemas/photos';
import { FLAG_KINDS, isFlagKind, LONGEST_FLAG } from '@/domain/flags/flags';
import { may, type Actor } from '@/domain/people/may';
import { appendAudit } from '../audit/append';
import { bookOf, type BookRow } from '../book/columns';
import { readable } from '../book/locate';
import { app } from '../context';
import { attachPhotos, unsentOf } from '../photos/attach';
import { forbidden, invalid, type RefusalError } from '../refusal';
import { loadFlag } from './rows';
import { shownFlag, type ShownFlag } from './shown';

export interface Doubt {
  /** Id of the step; null for the whole sheet. */
  step: string | null;
  kind: string;
  text: string;
  photos?: readonly PhotoChoice[];
}

interface Standing extends Pick<BookRow, 'bookKind' | 'shopId'> {
  procedureId: string;
  revisionId: string;
  /** Whether the step named is one of the current text. */
  known: number;
}

function problemsOf({ step, kind, text }: Doubt, known: boolean): RefusalError[] {
  return [
    ...(step !== null && !known ? [{ path: 'step', message: 'is no step of the current sheet' }] : []),
    ...(isFlagKind(kind) ? [] : [{ path: 'kind', message: `must be one of ${Object.keys(FLAG_KINDS).join(', ')}` }]),
    ...(text.trim() === '' ? [{ path: 'text', message: 'Write what is wrong or unclear.' }] : []),
    ...(text.length > LONGEST_FLAG ? [{ path: 'text', message: `must be ${LONGEST_FLAG} characters or fewer` }] : []),
  ];
}

/**
 * Raises a flag on the current sheet. The same words by the same person on the same step while they are open are one flag: a
 * double press is no second doubt. Refuses 404 an unseen sheet, 422 what cannot be.
 */
export async function raiseFlag(actor: Actor, number: string, doubt: Doubt): Promise<ShownFlag> {
  const { db } = await app();
  const id = await db.write(async () => {
    const [found] = await db.read<Standing>(
      `SELECT p.id AS procedureId, p.bookKind, p.shopId, r.id AS revisionId,
         (SELECT count(*) FROM renderings g, json_each(g.json, '$.steps') s
          WHERE g.hash = r.hash AND json_extract(s.value, '$.id') = :step) AS known
       FROM procedures p JOIN revisions r ON r.id = p.currentRevisionId WHERE p.number = :number`,
      { number, step: doubt.step ?? '' },
    );
    const row = readable(actor, found);
    const permission = may(actor, 'flag', { book: bookOf(row) });
    if (!permission.ok) throw forbidden(permission.why);
    const problems = problemsOf(doubt, row.known > 0);
    if (problems.length > 0) throw invalid('The flag cannot be raised like this.', problems);
    const { procedureId, revisionId, shopId } = row;
    const same = {
      procedureId,
      stepId: doubt.step,
      personId: actor.personId,
      text: doubt.text.trim(),
      state: 'open' as const,
    };
    const twin = await db.models.Flag.findOne({ where: same });
    if (twin) {
      // Raised again to show it: photos that were not sent yet go to the one that stands.
      const unsent = await unsentOf(actor, doubt.photos ?? []);
      await attachPhotos(actor, { type: 'flag', id: twin.id }, unsent);
      return twin.id;
    }
    const flag = await db.models.Flag.create({ ...same, revisionId, kind: doubt.kind as keyof typeof FLAG_KINDS });
    const sent = await attachPhotos(actor, { type: 'flag', id: flag.id }, doubt.photos ?? []);
    await appendAudit({
      actorId: actor.personId,
      act: 'flag.raised',
      subject: { type: 'flag', id: flag.id },
      shopId,
      detail: { number, step: doubt.step, kind: doubt.kind, ...sent },
    });
    return flag.id;
  });
  const raised = await loadFlag(id);
  if (!raised) throw new Error('The flag that was just raised is not there.');
  return shownFlag(actor, raised);
}
