import { clampOf, clampText } from '@/domain/procedure/clamp';
import type { Torque } from '@/domain/procedure/schema';
import { Value } from './Value';

/** The bar ends a little past proof load, so that a torque beyond it still shows how far. */
const FULL = 1.2;
const WIDTH = 240;

/** Clamp load as a bar, with a stroke where proof load stands. Said in words beside it. */
const Bar = ({ share }: { share: number }) => (
  <svg
    viewBox={`0 0 ${WIDTH} 12`}
    aria-hidden="true"
    className="mt-1.5 block h-3 w-full max-w-[300px]"
    preserveAspectRatio="none"
  >
    <rect x="0.5" y="3" width={WIDTH - 1} height="6" className="fill-white stroke-rule" />
    <rect
      x="0.5"
      y="3"
      width={Math.min(share / FULL, 1) * (WIDTH - 1)}
      height="6"
      className={`${share > 1 ? 'fill-ink' : 'fill-petrol'} [print-color-adjust:exact]`}
    />
    <line x1={WIDTH / FULL} x2={WIDTH / FULL} y1="0" y2="12" strokeWidth="1.6" className="stroke-ink" />
  </svg>
);

/** What a torque clamps with, against the proof load of its fastener: how plausible the number is, never a number to work to. */
export function ClampLine({ torque }: { torque: Torque }) {
  const check = clampOf(torque);
  const text = check && clampText(check);
  if (!check || !text) return null;
  const turns = (torque.angles?.length ?? 0) > 0;
  return (
    <div>
      {check.share !== null && <Bar share={check.share} />}
      <p className="leading-snug">
        {turns ? 'Clamps ' : 'Clamp '}
        <Value text={text} />
        {turns && ' before the turn'}
      </p>
      {check.verdict === 'over' && (
        <p className="border-l-[8px] border-ink pl-2.5 font-medium leading-snug">{check.why}</p>
      )}
    </div>
  );
}
