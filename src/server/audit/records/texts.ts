import type { Fault } from '@/domain/audit/fault';
import { hashOf } from '../../book/parsed';
import { app } from '../../context';

interface Row {
  id: string;
  number: string;
  letter: string | null;
  source: string;
  hash: string;
}
const SELECT = `SELECT r.id, p.number, r.letter, r.source, r.hash FROM revisions r JOIN procedures p ON p.id = r.procedureId`;

const textFaults = (rows: readonly Row[]): Fault[] =>
  rows.flatMap(({ id, number, letter, source, hash }) => {
    const given = hashOf(source);
    const differs = [
      `has another text than the one that was stored: it gives ${given.slice(0, 8)}, not ${hash.slice(0, 8)}`,
    ];
    return given === hash ? [] : [{ table: 'revisions' as const, id, at: null, number, letter, differs }];
  });

/** Those of a few revisions whose text does not give their hash. */
export async function textFaultsOf(ids: readonly string[]): Promise<Fault[]> {
  if (ids.length === 0) return [];
  const { db } = await app();
  return textFaults(await db.read<Row>(`${SELECT} WHERE r.id IN (:ids)`, { ids }));
}

/** Hashes the text of every revision of the book, some at a time. */
export async function allTextFaults(): Promise<{ texts: number; faults: Fault[] }> {
  const { db } = await app();
  const faults: Fault[] = [];
  let texts = 0;
  for (let after = ''; ;) {
    const rows = await db.read<Row>(`${SELECT} WHERE r.id > :after ORDER BY r.id LIMIT 100`, { after });
    if (rows.length === 0) return { texts, faults };
    faults.push(...textFaults(rows));
    texts += rows.length;
    after = rows.at(-1)?.id ?? after;
  }
}
