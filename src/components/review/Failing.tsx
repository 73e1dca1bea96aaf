import { dayOf } from '@/components/ui/day';
import { Notice } from '@/components/ui/Notice';
import type { FailingTorque, Proposal } from '@/domain/api/schemas/proposals';
import { overText } from '@/domain/review/overrides';

type Given = NonNullable<FailingTorque['override']>;

/** Who let a torque past proof load stand, and why. */
export const OverrideNote = ({ override: { person, reason, at } }: { override: Given }) => (
  <div className="remark-note">
    <b className="font-semibold">{person.name}</b> overrode this on {dayOf(at)}: {reason}
  </div>
);

const closed = (state: Proposal['state']) => state === 'published' || state === 'superseded';

/** Near the acts: which torques fail the clamp check, and how far each has got. The rows below say why and take the reason. */
export function Failing({ proposal, rows }: { proposal: Proposal; rows: boolean }) {
  const { failing, state, may } = proposal;
  if (failing.length === 0 || state === 'declined') return null;
  const open = failing.filter(({ override }) => override === null).length;
  const title = closed(state)
    ? 'Published past proof load, with a reason'
    : open > 0
      ? 'The clamp check fails'
      : 'The clamp check fails, and was overridden';
  return (
    <Notice title={title}>
      <ul>
        {failing.map(({ key, name, share, override }) => (
          <li key={key} className="mt-1">
            <b className="font-semibold">{name}</b>: clamps to {overText(share)} of proof load.{' '}
            {override
              ? `${override.person.name} overrode this on ${dayOf(override.at)}: ${override.reason}`
              : !may.override && 'An editor must override it with a written reason before this can be published.'}{' '}
            {rows && !override && may.override && <a href={`#clamp-${key}`}>Judge it</a>}
          </li>
        ))}
      </ul>
    </Notice>
  );
}
