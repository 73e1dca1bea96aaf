import type { Words } from '@/domain/writing/textChanges';

/** Words kept on this device until the server has them. */
export interface Held extends Words {
  /** Version of the draft that they were typed on. */
  version: number;
  /** When, in milliseconds since 1970. */
  at: number;
}

/** As much of `localStorage` as is needed; it throws where it is full or switched off. */
export type Store = Pick<Storage, 'getItem' | 'setItem' | 'removeItem' | 'key' | 'length'>;

const prefix = (id: string) => `matchmark:draft:${id}:`;

function read(store: Store, key: string): Held | null {
  try {
    const value = JSON.parse(store.getItem(key) ?? 'null') as Partial<Held> | null;
    const { source, reason, version, at } = value ?? {};
    return typeof source === 'string' && typeof reason === 'string' && typeof version === 'number'
      ? { source, reason, version, at: at ?? 0 }
      : null;
  } catch {
    return null;
  }
}

/**
 * The device's copy of one draft. Every page that has it open keeps its own, so that two tabs do not write over
 * each other's words.
 */
export class HeldCopy {
  private readonly own: string;

  constructor(
    private readonly store: Store | null,
    private readonly id: string,
    page: string,
  ) {
    this.own = prefix(id) + page;
  }

  /** False where the device cannot keep it. */
  write(held: Held): boolean {
    try {
      this.store?.setItem(this.own, JSON.stringify(held));
      return this.store !== null;
    } catch {
      return false;
    }
  }

  clear(): void {
    try {
      this.store?.removeItem(this.own);
    } catch {
      // Storage that is switched off holds nothing to clear.
    }
  }

  /** Takes over the newest copy that an earlier page left behind, if any; it is this page's from now on. */
  adopt(): Held | null {
    try {
      const { store } = this;
      if (!store) return null;
      const left = Array.from({ length: store.length }, (_, i) => store.key(i))
        .filter((key): key is string => key?.startsWith(prefix(this.id)) === true && key !== this.own)
        .flatMap((key) => {
          const held = read(store, key);
          return held ? [{ key, held }] : [];
        })
        .sort((a, b) => b.held.at - a.held.at);
      const [newest] = left;
      if (!newest) return null;
      this.write(newest.held);
      store.removeItem(newest.key);
      return newest.held;
    } catch {
      return null;
    }
  }
}
