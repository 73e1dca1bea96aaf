import type { Fault, FaultTable } from '@/domain/audit/fault';

/** Which entries, or which rows, are looked at: SQL conditions with their replacements. */
export interface Scope {
  /** On the entry `e`. */
  entries: string;
  /** On the revision `r` and the procedure `p` that a row belongs to. */
  rows: string;
  replacements: Record<string, unknown>;
}

/** Every entry that speaks of a row comes with these. */
export interface Spoken {
  seq: number;
  at: string;
  /** JSON text of the entry. */
  detail: string;
  /** Null where the row is gone. */
  id: string | null;
  number: string | null;
  letter: string | null;
}

/** How one kind of row is held against the trail. */
export interface RecordCheck<Row extends Spoken = Spoken> {
  table: FaultTable;
  /** Selects the entries that speak of such rows, each with its row. */
  spoken: (entries: string) => string;
  /** What of the row is not as the entry says; not asked where the row is gone. */
  differs: (row: Row, told: Record<string, unknown>) => string[];
  /** Whether a row may be gone: a draft that was never sent in can be thrown away. */
  mayBeGone?: (row: Row) => boolean;
  /** Selects `{id, number, letter}` of rows that no entry speaks of. */
  unspoken?: (rows: string) => string;
}

/** Keeps the row type of a check to itself, so that a list can hold them all. */
export const recordCheck = <Row extends Spoken>(check: RecordCheck<Row>): RecordCheck =>
  check as unknown as RecordCheck;

/** The faults that one entry and its row show. */
export function faultOf(check: RecordCheck, row: Spoken): Fault[] {
  const told = JSON.parse(row.detail) as Record<string, unknown>;
  const named = (name: string) => (typeof told[name] === 'string' ? told[name] : null);
  const gone = row.id === null;
  if (gone && check.mayBeGone?.(row)) return [];
  const differs = gone ? [`of which entry ${row.seq} tells is gone or was changed`] : check.differs(row, told);
  if (differs.length === 0) return [];
  const { table } = check;
  const number = row.number ?? named('number');
  return [
    { table, id: row.id ?? `entry ${row.seq}`, at: row.at, number, letter: row.letter ?? named('letter'), differs },
  ];
}
