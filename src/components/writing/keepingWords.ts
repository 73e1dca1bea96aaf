import type { Keeping } from './keeper';

/** "20 seconds ago". Both in milliseconds since 1970. */
export function ago(at: number, now: number): string {
  const seconds = Math.max(0, Math.round((now - at) / 1000));
  if (seconds < 5) return 'just now';
  if (seconds < 60) return `${seconds < 10 ? seconds : Math.floor(seconds / 10) * 10} seconds ago`;
  const minutes = Math.floor(seconds / 60);
  if (minutes < 60) return minutes === 1 ? 'a minute ago' : `${minutes} minutes ago`;
  const hours = Math.floor(minutes / 60);
  if (hours < 48) return hours === 1 ? 'an hour ago' : `${hours} hours ago`;
  return `${Math.floor(hours / 24)} days ago`;
}

const held = (onDevice: boolean) =>
  onDevice ? 'Your words are held on this device.' : 'This device cannot hold them: keep this page open.';

type Unreachable = Extract<Keeping, { kind: 'unreachable' }>['why'];

/** When words that this device holds go to the server. */
const SENT: Record<Unreachable, string> = {
  network: 'Sent when the network is back.',
  'signed out': 'You are signed out: sent when you sign in again.',
  busy: 'The book is busy: sent in a moment.',
};
const IN_THE_WAY: Record<Unreachable, string> = {
  network: 'no network',
  'signed out': 'you are signed out',
  busy: 'the book is busy',
};

/**
 * How it stands with the draft, in a sentence.
 *
 * @param opened when the draft was last saved before this page was opened
 * @param now null before the page knows the time
 */
export function keepingWords(state: Keeping, opened: number, now: number | null): string {
  switch (state.kind) {
    case 'kept':
      return now === null ? 'Draft kept' : `Draft kept ${ago(state.at ?? opened, now)}`;
    case 'waiting':
    case 'keeping':
      return 'Keeping the draft';
    case 'unreachable':
      return state.onDevice
        ? `Kept on this device. ${SENT[state.why]}`
        : `Not kept: ${IN_THE_WAY[state.why]}. ${held(false)}`;
    case 'refused':
      return `Not kept: ${state.why.replace(/\.$/, '')}. ${held(state.onDevice)}`;
    case 'stale':
      return 'Changed elsewhere: say which text goes on.';
  }
}
