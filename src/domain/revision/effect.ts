/** What kinds of effect a change can have at the bench. */
export type EffectKind =
  | 'past-proof'
  | 'unit-mix-up'
  | 'caution-weaker'
  | 'caution-removed'
  | 'caution-stronger'
  | 'caution-reworded'
  | 'hold-dropped'
  | 'hold-added'
  | 'hold-changed'
  | 'limit-wider'
  | 'limit-narrower'
  | 'limit-moved'
  | 'limit-restated'
  | 'part-reused'
  | 'part-treated-otherwise'
  | 'torque-up'
  | 'torque-down'
  | 'tolerance-looser'
  | 'tolerance-tighter'
  | 'passes-dropped'
  | 'passes-added'
  | 'turns-changed'
  | 'fastener-changed'
  | 'order-changed'
  | 'time-shorter'
  | 'time-longer';

/** What a change does at the bench, said to a reviewer. */
export interface Effect {
  kind: EffectKind;
  /** "Wider: allows 0.02 mm more"; no full stop. */
  words: string;
  /** What it does as a reason, "the limit “Gap” is wider", where it is grave by itself; null otherwise. */
  grave: string | null;
}

export const effect = (kind: EffectKind, words: string, grave: string | null = null): Effect => ({
  kind,
  words,
  grave,
});
