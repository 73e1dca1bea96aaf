/** A step's two places on the page: how far below the top of the gutter its title stands, px. */
export interface Place {
  id: string;
  kind: 'same' | 'edited' | 'added' | 'removed';
  moved: boolean;
  /** Null where the step is not in that text. */
  old: number | null;
  now: number | null;
}

/** A stroke of the gutter. */
export interface Line {
  id: string;
  look: 'same' | 'edited' | 'moved' | 'added' | 'removed';
  /** SVG path data. */
  d: string;
  /** Short ink strokes across the line, as path data; empty where there are none. */
  ticks: string;
}

/** How much of the gutter a line crosses that starts from nowhere or ends there. */
const STUB = 0.3;
/** Half the height of a tick, and half the gap between the two, px. */
const TICK = 8;
const GAP = 8;

/** Whole pixels keep strokes of even width crisp; thin ones stand on the half. */
const crisp = (y: number, thin: boolean) => Math.round(y) + (thin ? 0.5 : 0);

/** A point of the curve from (0, a) to (width, b) whose handles stand at half its width. */
function onCurve(t: number, width: number, a: number, b: number): [x: number, y: number] {
  const s = 1 - t;
  const handles = 1.5 * s * t;
  return [width * (handles + t * t * t), a * (s * s * s + 3 * s * s * t) + b * (t * t * t + 3 * s * t * t)];
}

const round = (value: number) => Math.round(value * 100) / 100;

function ticksOf(width: number, a: number, b: number, straight: boolean): string {
  const off = GAP / width;
  return [0.5 - off, 0.5 + off]
    .map((t) => {
      const [x, y] = straight ? [width * t, a + (b - a) * t] : onCurve(t, width, a, b);
      // A tick stands on a whole pixel sideways as the line does upright.
      return `M${Math.round(x)} ${round(y - TICK)}v${2 * TICK}`;
    })
    .join('');
}

/** The lines that join what belongs together left and right, across a gutter of a width in px. */
export function matchLines(places: readonly Place[], width: number): Line[] {
  return places.flatMap(({ id, kind, moved, old, now }): Line[] => {
    const look = kind === 'same' && moved ? 'moved' : kind;
    if (old === null || now === null) {
      const y = old ?? now;
      if (y === null) return [];
      const stub = Math.round(width * STUB);
      const d = old === null ? `M${width} ${crisp(y, false)}H${width - stub}` : `M0 ${crisp(y, false)}H${stub}`;
      return [{ id, look, d, ticks: '' }];
    }
    const thin = look === 'same';
    const [a, b] = [crisp(old, thin), crisp(now, thin)];
    const half = round(width / 2);
    const d = moved
      ? `M0 ${a}L${width} ${b}`
      : a === b
        ? `M0 ${a}H${width}`
        : `M0 ${a}C${half} ${a} ${half} ${b} ${width} ${b}`;
    return [{ id, look, d, ticks: kind === 'edited' ? ticksOf(width, a, b, moved || a === b) : '' }];
  });
}
