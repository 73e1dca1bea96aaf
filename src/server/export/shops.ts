import { slugOf } from '@/domain/export/slug';
import { app } from '../context';
import { CannotExport } from './git';

/** The id of the shop that a slug of its name stands for. Throws `CannotExport` with the slugs that there are. */
export async function shopBySlug(slug: string): Promise<string> {
  const { db } = await app();
  const shops = await db.read<{ id: string; name: string }>('SELECT id, name FROM shops ORDER BY name');
  const found = shops.filter(({ name }) => slugOf(name) === slug);
  if (found.length === 1 && found[0]) return found[0].id;
  const known = shops.map(({ name }) => slugOf(name)).join(', ') || 'none';
  throw new CannotExport(
    found.length > 1
      ? `Two shops are called ${slug}; give one of them another name.`
      : `There is no shop ${slug}. There are: ${known}.`,
  );
}
