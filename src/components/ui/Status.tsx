/** Says in words what just happened, beside what was pressed. Always in the page, so that a change is spoken. */
export const Status = ({ text, className }: { text: string; className?: string }) => (
  <p role="status" className={className ?? 'min-h-6 text-ink-2'}>
    {text}
  </p>
);
