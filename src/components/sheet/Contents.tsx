/** Where a long sheet's steps are. Short sheets are their own contents. */
export const LONG_SHEET = 8;

interface Entry {
  id: string;
  number: number;
  title: string;
}

const Links = ({ steps }: { steps: readonly Entry[] }) => (
  <ol className="gap-x-8 sm:columns-2 lg:columns-3">
    {steps.map((step) => (
      <li key={step.id} className="break-inside-avoid">
        <a
          href={`#step-${step.id}`}
          className="grid min-h-[34px] grid-cols-[1.75rem_1fr] items-baseline py-1.5 text-ink no-underline hover:underline max-sm:min-h-touch max-sm:py-3"
        >
          <span className="font-semibold text-petrol">{step.number}</span>
          {step.title}
        </a>
      </li>
    ))}
  </ol>
);

/** Links to every step of a long sheet: open at a desk, folded on a phone. */
export function Contents({ steps }: { steps: readonly Entry[] }) {
  if (steps.length <= LONG_SHEET) return null;
  return (
    <nav aria-label="Steps" className="px-4 print:hidden sm:px-6">
      <details className="sm:hidden">
        <summary className="flex min-h-touch cursor-pointer items-center gap-2 font-semibold">
          {steps.length} steps
          <span aria-hidden="true" className="text-petrol">
            show
          </span>
        </summary>
        <Links steps={steps} />
      </details>
      <div className="hidden py-4 sm:block">
        <Links steps={steps} />
      </div>
    </nav>
  );
}
