/** Opens the panel of a return at its step; where no script runs, the page with that panel. */
export function ReturnHere({ step, onAsk }: { step: string; onAsk: (anchor: string) => void }) {
  const anchor = `step:${step}`;
  return (
    <a
      id={`ask-${anchor}`}
      href={`?give=return&at=${encodeURIComponent(anchor)}#give`}
      className="return-here"
      onClick={(event) => {
        event.preventDefault();
        onAsk(anchor);
      }}
    >
      Return here
    </a>
  );
}
