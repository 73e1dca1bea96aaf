import { gaugeText } from '@/domain/procedure/gauge';
import type { Limit } from '@/domain/procedure/schema';
import { Value } from './Value';

/** How fine a tool must read for a limit: ten steps to its tolerance. Nothing for a limit with one end. */
export function GaugeLine({ limit }: { limit: Limit }) {
  const text = gaugeText(limit);
  return text ? (
    <p className="leading-snug">
      Read to <Value text={text} /> or finer
    </p>
  ) : null;
}
