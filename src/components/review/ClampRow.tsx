import type { ReactNode } from 'react';
import type { ClampChange } from '@/domain/revision/types';

/** The clamp load of a torque then and now, under its row; past proof load or a likely mix-up of units cannot be overlooked. */
export function ClampRow({
  load,
  columns,
  fresh,
  children,
}: {
  load: ClampChange;
  columns: number;
  fresh: boolean;
  /** What was written about it, and where a reason is written. */
  children?: ReactNode;
}) {
  const grave = load.verdict === 'over' || load.mixUps.length > 0;
  return (
    <tr id={`clamp-${load.key}`} className="clamp-row">
      <td colSpan={columns}>
        <div className={grave ? 'heavy-edge px-3 py-2' : undefined}>
          <p>
            <span className="text-ink-2">Clamp load </span>
            {!fresh && load.from !== null && (
              <>
                {load.from}
                <span className="text-ink-2"> becomes </span>
              </>
            )}
            <b className="font-semibold">{load.to ?? 'not known'}</b>
          </p>
          {load.verdict !== 'ok' && <p className={load.verdict === 'over' ? 'font-semibold' : undefined}>{load.why}</p>}
          {load.mixUps.map((mixUp) => (
            <p key={mixUp} className="font-semibold">
              {mixUp}
            </p>
          ))}
          {children}
        </div>
      </td>
    </tr>
  );
}
