import type { RevisionSummary } from '@/domain/api/schemas/book';
import type { Actor } from '@/domain/people/may';
import { standingOf, type TrailStanding } from '../audit/standing';
import { readLetters } from './history';
import { readTimeline, type HistoryOfProcedure, type HistoryPlace } from './timeline';

export interface HistoryPage {
  history: HistoryOfProcedure;
  letters: Pick<RevisionSummary, 'letter' | 'publishedAt'>[];
  /** How what is shown stands in the audit trail, looked at now. */
  trail: TrailStanding & { texts: number };
}

/** All that the history of a sheet shows. Refuses 404 what is unknown or not readable. */
export async function readHistoryPage(actor: Actor, number: string, place: HistoryPlace): Promise<HistoryPage> {
  const history = await readTimeline(actor, number, place);
  const ids = history.events.flatMap(({ kind, id }) => (kind === 'revision' ? [id] : []));
  const [letters, trail] = await Promise.all([
    readLetters(actor, number),
    standingOf({ id: history.procedureId, number }, ids),
  ]);
  return { history, letters, trail: { ...trail, texts: ids.length } };
}
