import type { ReactNode } from 'react';

/** Nothing here yet: says why and what to do first. `children` hold that, an action included. */
export function EmptyState({ title, children }: { title: string; children: ReactNode }) {
  return (
    <div className="flex flex-col items-start gap-3 px-6 py-12 sm:px-10">
      <svg width="64" height="40" viewBox="0 0 64 40" fill="none" aria-hidden="true" className="mb-1 text-rule">
        <path d="M2 20h60M16 4v12M16 24v12M32 4v12M48 4v12M48 24v12" stroke="currentColor" strokeWidth="3" />
        <path d="M32 24v12" stroke="currentColor" strokeWidth="3" strokeDasharray="3 3" />
      </svg>
      <h2 className="text-lead">{title}</h2>
      <div className="flex max-w-prose flex-col items-start gap-4 text-ink-2">{children}</div>
    </div>
  );
}
