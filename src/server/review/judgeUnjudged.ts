import { app } from '../context';
import { weigh } from './draftText';

/**
 * Finds the torques that fail the clamp check of every text on its way that was saved before that was kept, so that
 * none is published unjudged. Once done it finds nothing to do.
 */
export async function judgeUnjudged(): Promise<void> {
  const { db } = await app();
  const rows = await db.read<{ id: string; source: string; parentId: string | null; version: number }>(
    `SELECT id, source, parentId, version FROM revisions
     WHERE failingTorques IS NULL AND state IN ('draft', 'proposed', 'returned')`,
  );
  for (const { id, source, parentId, version } of rows) {
    const { failingTorques } = await weigh(source, parentId);
    // Where somebody saved it meanwhile, the saving has judged it.
    await db.write(async () => {
      await db.models.Revision.update({ failingTorques }, { where: { id, version } });
    });
  }
}
