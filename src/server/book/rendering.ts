import type { RenderedProcedure } from '@/domain/procedure/types';
import { app } from '../context';
import { parsedText } from './parsed';

/** Raise it whenever the parser makes other HTML of the same text; older renderings are then made again. */
export const RENDERING_FORM = 2;

/** Keeps what a text looks like under the hash of the text. Call it in the `write` that saves the text. */
export async function keepRendering(hash: string, rendered: RenderedProcedure): Promise<void> {
  const { db } = await app();
  await db.write(() =>
    db.models.Rendering.upsert({ hash, form: RENDERING_FORM, json: JSON.stringify(rendered) }).then(() => undefined),
  );
}

/**
 * The rendering of a stored text. `json` is what the database holds; only where that is missing or of an
 * older form is the text parsed, once, and the rendering kept.
 *
 * @throws Error where a text that was accepted once can no longer be read
 */
export async function renderingOf(
  revision: { hash: string; source: string },
  kept: { form: number | null; json: string | null },
): Promise<RenderedProcedure> {
  if (kept.json !== null && kept.form === RENDERING_FORM) return JSON.parse(kept.json) as RenderedProcedure;
  const parsed = await parsedText(revision.source);
  if (!parsed.ok) throw new Error(`The stored text ${revision.hash.slice(0, 8)} can no longer be read.`);
  await keepRendering(revision.hash, parsed.rendered);
  return parsed.rendered;
}

/** The rendering of a stored text, from the database where it is there. */
export async function readRendering(revision: { hash: string; source: string }): Promise<RenderedProcedure> {
  const { db } = await app();
  const [kept] = await db.read<{ form: number; json: string }>('SELECT form, json FROM renderings WHERE hash = :hash', {
    hash: revision.hash,
  });
  return renderingOf(revision, kept ?? { form: null, json: null });
}
