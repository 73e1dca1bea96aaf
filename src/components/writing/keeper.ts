import type { Proposal } from '@/domain/api/schemas/proposals';
import { sizeProblem } from '@/domain/procedure/bounds';
import { Refused } from './api';
import type { Words } from '@/domain/writing/textChanges';
import type { Held } from './heldCopy';

/** How it stands with the words on the screen. */
export type Keeping =
  | { kind: 'kept'; at: number | null }
  | { kind: 'waiting' }
  | { kind: 'keeping' }
  /** Tried again by itself; `why` says what stands in the way. */
  | { kind: 'unreachable'; why: 'network' | 'signed out' | 'busy'; onDevice: boolean }
  /** Not tried again before something changes. */
  | { kind: 'refused'; why: string; onDevice: boolean }
  /** Saved elsewhere meanwhile; the author chooses. */
  | { kind: 'stale'; theirs: Proposal };

export interface Surroundings {
  save: (words: Words, version: number, keepalive: boolean) => Promise<{ version: number }>;
  readTheirs: () => Promise<Proposal>;
  held: { write: (held: Held) => boolean; clear: () => void };
  /** Told of each version that the server has from here, so that other pages of the draft can look. */
  saved?: (version: number) => void;
  now: () => number;
  /** Calls back after so many milliseconds; returns how to call it off. */
  later: (act: () => void, ms: number) => () => void;
}

const PAUSE = 1000;
const FIRST_RETRY = 3000;
const LAST_RETRY = 60_000;

const same = (a: Readonly<Words>, b: Readonly<Words>) => a.source === b.source && a.reason === b.reason;

/**
 * Keeps a draft: on this device at once, on the server after a pause in typing. One save is under way at a time, each
 * on the version that the one before it returned. Knows nothing of the screen.
 */
export class Keeper {
  private wanted: Words;
  private listeners = new Set<() => void>();
  private stopWaiting: (() => void) | null = null;
  private running: Promise<void> | null = null;
  private retry = FIRST_RETRY;
  private onDevice = true;
  state: Keeping = { kind: 'kept', at: null };

  constructor(
    private kept: Words,
    public version: number,
    private readonly around: Surroundings,
  ) {
    this.wanted = kept;
  }

  subscribe = (listener: () => void) => {
    this.listeners.add(listener);
    return () => this.listeners.delete(listener);
  };
  snapshot = () => this.state;

  private become(state: Keeping) {
    this.state = state;
    for (const listener of this.listeners) listener();
  }

  private pending = () => !same(this.wanted, this.kept);

  /** True where closing the page could lose something that this device does not hold either. */
  get atRisk(): boolean {
    return this.pending() || this.running !== null;
  }

  change(words: Words): void {
    if (same(words, this.wanted)) return;
    this.wanted = words;
    if (this.state.kind === 'stale') {
      this.hold();
      return;
    }
    if (!this.pending() && !this.running) {
      this.settle();
      return;
    }
    this.hold();
    if (!this.running) this.become({ kind: 'waiting' });
    this.schedule(PAUSE);
  }

  private hold() {
    this.onDevice = this.around.held.write({ ...this.wanted, version: this.version, at: this.around.now() });
  }

  private settle() {
    this.stopWaiting?.();
    this.stopWaiting = null;
    this.retry = FIRST_RETRY;
    this.around.held.clear();
    this.become({ kind: 'kept', at: this.around.now() });
  }

  private schedule(ms: number) {
    this.stopWaiting?.();
    this.stopWaiting = this.around.later(() => void this.flush(), ms);
  }

  /** Saves now what is not saved yet. True once the server has every word. */
  async flush({ keepalive = false } = {}): Promise<boolean> {
    this.stopWaiting?.();
    this.stopWaiting = null;
    while (this.running) await this.running;
    if (this.state.kind === 'stale') return false;
    if (!this.pending()) return true;
    this.running = this.send(keepalive).finally(() => (this.running = null));
    await this.running;
    const { kind } = this.state as Keeping;
    if (kind !== 'waiting') return kind === 'kept';
    return this.flush({ keepalive });
  }

  private async send(keepalive: boolean): Promise<void> {
    const sent = this.wanted;
    const large = sizeProblem(sent.source);
    if (large) {
      this.become({ kind: 'refused', why: large.message, onDevice: this.onDevice });
      return;
    }
    this.become({ kind: 'keeping' });
    try {
      this.take(sent, (await this.around.save(sent, this.version, keepalive)).version);
    } catch (error) {
      await this.failed(error, sent);
    }
  }

  private take(sent: Words, version: number) {
    this.version = version;
    this.kept = sent;
    this.around.saved?.(version);
    if (this.pending()) {
      this.hold();
      this.become({ kind: 'waiting' });
    } else this.settle();
  }

  private async failed(error: unknown, sent: Words): Promise<void> {
    const { onDevice } = this;
    if (!(error instanceof Refused)) return this.tryLater('network');
    if (error.status === 401) return this.tryLater('signed out');
    if (error.status === 429 || error.status >= 500) return this.tryLater('busy');
    if (error.status !== 409 || typeof error.problem['version'] !== 'number') {
      this.become({ kind: 'refused', why: error.message, onDevice });
      return;
    }
    try {
      const theirs = await this.around.readTheirs();
      // Our own save arrived, only its answer did not.
      if (same(theirs, sent)) this.take(sent, theirs.version);
      else this.movedOn(theirs);
    } catch {
      this.tryLater('network');
    }
  }

  /** The draft is another one on the server than here. */
  private movedOn(theirs: Proposal) {
    const { onDevice } = this;
    this.stopWaiting?.();
    if (theirs.may.edit) this.become({ kind: 'stale', theirs });
    else this.become({ kind: 'refused', why: theirs.whyNot['edit'] ?? 'It can no longer be written on', onDevice });
  }

  /** Looks whether the draft was saved elsewhere, before anything is typed over it. Changes nothing on the server. */
  async look(): Promise<void> {
    const { kind } = this.state;
    if (this.running || (kind !== 'kept' && kind !== 'stale')) return;
    const { version } = this;
    const theirs = await this.around.readTheirs().catch(() => null);
    // What was typed meanwhile is saved anyway, and then told the same.
    if (!theirs || this.running || this.version !== version || this.state.kind !== kind) return;
    if (theirs.version <= (this.state.kind === 'stale' ? this.state.theirs.version : version)) return;
    if (!same(theirs, this.wanted)) return this.movedOn(theirs);
    this.version = theirs.version;
    this.kept = this.wanted;
    this.settle();
  }

  private tryLater(why: Extract<Keeping, { kind: 'unreachable' }>['why']) {
    this.become({ kind: 'unreachable', why, onDevice: this.onDevice });
    this.schedule(this.retry);
    this.retry = Math.min(this.retry * 2, LAST_RETRY);
  }

  /** Says that words held on this device stand on another version than the server's. */
  found(words: Words, theirs: Proposal) {
    this.wanted = words;
    this.version = theirs.version;
    this.become({ kind: 'stale', theirs });
  }

  /**
   * Goes on from what was saved elsewhere; returns the words that are set aside, so that they can be put back, and whether
   * the server never had them.
   */
  takeTheirs(): { set: Words; aside: Words; unsaved: boolean } | null {
    if (this.state.kind !== 'stale') return null;
    const { source, reason, version } = this.state.theirs;
    const aside = this.wanted;
    const unsaved = this.pending();
    this.version = version;
    this.kept = this.wanted = { source, reason };
    this.settle();
    return { set: this.kept, aside, unsaved };
  }

  /** Saves the words on the screen over what was saved elsewhere. */
  keepMine(): Promise<boolean> {
    if (this.state.kind === 'stale') {
      const { source, reason, version } = this.state.theirs;
      this.version = version;
      this.kept = { source, reason };
      // Typed on until they said the same: there is nothing left to save.
      if (this.pending()) this.become({ kind: 'waiting' });
      else this.settle();
    }
    return this.flush();
  }

  /** Another call changed the draft on the server and returned its version. */
  moved(version: number) {
    this.version = version;
  }

  dispose() {
    this.stopWaiting?.();
  }
}
