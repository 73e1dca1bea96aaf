import { clampOf, clampText, OUT_OF_TABLES, sizeMixUp } from '@/domain/procedure/clamp';
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

/**
 * What a torque clamps with, against the proof load of its fastener: how plausible the number is, never a number to
 * work to.
 *
 * @param tellAll for whoever writes the number: also why nothing can be said, a low clamp, and units that may have been mixed up
 */
export function ClampLine({ torque, tellAll = false }: { torque: Torque; tellAll?: boolean }) {
  const check = clampOf(torque);
  const text = check && clampText(check);
  const turns = (torque.angles?.length ?? 0) > 0;
  const mixUp = tellAll ? sizeMixUp(torque) : null;
  const why = check?.verdict === 'over' || (tellAll && check?.verdict !== 'ok') ? (check?.why ?? OUT_OF_TABLES) : null;
  if (!text && !why) return null;
  return (
    <div>
      {typeof check?.share === 'number' && <Bar share={check.share} />}
      {text && (
        <p className="leading-snug">
          {turns ? 'Clamps ' : 'Clamp '}
          <Value text={text} />
          {turns && ' before the turn'}
        </p>
      )}
      {why && (
        <p
          className={
            check?.verdict === 'over' ? 'border-l-[8px] border-ink pl-2.5 font-medium leading-snug' : 'leading-snug'
          }
        >
          {why}
        </p>
      )}
      {mixUp && <p className="border-l-[8px] border-ink pl-2.5 font-medium leading-snug">{mixUp}</p>}
    </div>
  );
}
