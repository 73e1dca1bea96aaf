/** A text with what matched marked: wash and a petrol line under it. */
export function Marked({ text, marks, from = 0 }: { text: string; marks: readonly [number, number][]; from?: number }) {
  const parts: { text: string; at: number; marked: boolean }[] = [];
  let at = from;
  for (const [start, end] of marks) {
    if (end <= at) continue;
    if (start > at) parts.push({ text: text.slice(at, start), at, marked: false });
    const begin = Math.max(start, at);
    parts.push({ text: text.slice(begin, end), at: begin, marked: true });
    at = end;
  }
  if (at < text.length) parts.push({ text: text.slice(at), at, marked: false });
  return parts.map((part) =>
    part.marked ? (
      <mark
        key={part.at}
        className="box-decoration-clone bg-wash px-[3px] text-ink shadow-[inset_0_-2.5px_theme(colors.petrol)]"
      >
        {part.text}
      </mark>
    ) : (
      part.text
    ),
  );
}
