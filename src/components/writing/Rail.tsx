import { useDesk } from './desk';
import { hashOfPlace, LIST_NAMES, RAIL, samePlace } from './places';
import { RailLink } from './RailLink';
import { RailSteps } from './RailSteps';

const HEAD = ['title', 'summary', 'system', 'engines', 'minutes', 'skill', 'critical', 'intro'];

/** How much is to mend in a list, or in the head of the sheet. */
function useFaults() {
  const { problems } = useDesk();
  return {
    list: (list: string) => problems.filter((p) => p.path?.split('.')[0] === list).length,
    head: problems.filter((p) => HEAD.includes(p.path?.split('.')[0] ?? '')).length,
  };
}

const Title = ({ children }: { children: string }) => <h2 className="mb-1 px-4 text-[1rem]">{children}</h2>;

/** Everything the sheet is made of, one line each; what is chosen shows in the middle. */
export function Rail() {
  const { draft, place } = useDesk();
  const faults = useFaults();
  return (
    <nav aria-label="Parts of the sheet" className="flex flex-col gap-5 py-4">
      <div>
        <Title>Steps</Title>
        <RailSteps />
      </div>
      {RAIL.map(({ title, lists }) => (
        <div key={title}>
          <Title>{title}</Title>
          {title === 'The sheet' && (
            <RailLink to="sheet" on={place === 'sheet'} faults={faults.head}>
              Title, engines, introduction
            </RailLink>
          )}
          {lists.map((list) => (
            <RailLink
              key={list}
              to={{ list }}
              on={samePlace(place, { list })}
              number={draft[list].length}
              faults={faults.list(list)}
            >
              {LIST_NAMES[list]}
            </RailLink>
          ))}
        </div>
      ))}
    </nav>
  );
}

/** The same on a phone: one choice of the browser's own. */
export function RailChoice() {
  const { draft, place, choose } = useDesk();
  const faults = useFaults();
  const mend = (n: number) => (n ? `, ${n} to mend` : '');
  return (
    <div className="flex flex-col gap-1.5 px-4 py-3">
      <label htmlFor="writing-place" className="font-medium">
        Part of the sheet
      </label>
      <select
        id="writing-place"
        className="field-box"
        value={hashOfPlace(place)}
        onChange={(event) => {
          location.hash = event.target.value;
        }}
      >
        <optgroup label="Steps">
          {draft.steps.map((step, i) => (
            <option key={step.id} value={hashOfPlace({ step: step.id })}>
              {i + 1}. {step.title || 'No title yet'}
            </option>
          ))}
        </optgroup>
        {RAIL.map(({ title, lists }) => (
          <optgroup key={title} label={title}>
            {title === 'The sheet' && <option value="#sheet">Title, engines, introduction{mend(faults.head)}</option>}
            {lists.map((list) => (
              <option key={list} value={hashOfPlace({ list })}>
                {LIST_NAMES[list]}, {draft[list].length}
                {mend(faults.list(list))}
              </option>
            ))}
          </optgroup>
        ))}
        {place === 'changes' && <option value="#changes">What changes</option>}
      </select>
      <StepTurns onTurn={choose} />
    </div>
  );
}

function StepTurns({ onTurn }: { onTurn: ReturnType<typeof useDesk>['choose'] }) {
  const { draft, place } = useDesk();
  const at = typeof place === 'object' && 'step' in place ? draft.steps.findIndex((s) => s.id === place.step) : -1;
  if (at < 0) return null;
  const [before, after] = [draft.steps[at - 1], draft.steps[at + 1]];
  const look = 'inline-flex min-h-touch items-center font-semibold text-petrol underline underline-offset-[3px]';
  return (
    <div className="flex justify-between">
      {before ? (
        <button type="button" className={look} onClick={() => onTurn({ step: before.id })}>
          Step before
        </button>
      ) : (
        <span />
      )}
      {after && (
        <button type="button" className={look} onClick={() => onTurn({ step: after.id })}>
          Next step
        </button>
      )}
    </div>
  );
}
