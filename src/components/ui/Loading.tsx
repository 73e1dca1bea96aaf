/** Stands where content is on its way, at the height it will have: `lines` quiet bars and a sentence for ears. */
export function Loading({ text, lines = 3 }: { text: string; lines?: number }) {
  return (
    <div role="status" className="flex flex-col gap-3 py-2">
      <span className="text-small text-ink-2">{text}</span>
      {Array.from({ length: lines }, (_, line) => (
        <span key={line} className="block h-4 bg-hair" style={{ width: `${[92, 78, 85, 60][line % 4]}%` }} />
      ))}
    </div>
  );
}
