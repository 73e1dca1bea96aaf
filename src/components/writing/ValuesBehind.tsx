import { listed } from '@/domain/wording';
import { PASS_WORDS } from '@/domain/writing/chipWords';
import { boxesOf, type Entry } from '@/domain/writing/draft';
import { keysIn, stepsUsing } from '@/domain/writing/uses';
import { BoxCell, Cell } from './Cell';
import { COLUMNS } from './columns';
import { useDesk } from './desk';
import { RowProblems } from './RowProblems';

const TORQUE_FIELDS = ['name', 'nm', 'tolerance', 'condition'];
const LIMIT_FIELDS = ['name', 'min', 'nominal', 'max', 'unit'];

const column = (list: 'torques' | 'limits', field: string) => {
  const found = COLUMNS[list].find((one) => one.field === field);
  if (!found) throw new Error(`No column ${field}.`);
  return found;
};

/** "M6×1, 8.8" as far as it is filled in. */
const threadOf = (entry: Entry) =>
  [[entry['thread'], entry['pitch']].filter(Boolean).join('×'), entry['class']].filter(Boolean).join(', ');

const HEAD = 'px-2.5 py-1.5 text-left text-small font-normal text-ink-2';
const CELL = 'border-l border-t border-hair p-0 first:border-l-0';

function Torques({ keys }: { keys: readonly string[] }) {
  const { draft } = useDesk();
  const rows = draft.torques.flatMap((entry, index) => (keys.includes(entry['key'] ?? '') ? [{ entry, index }] : []));
  return (
    <div>
      <table className="w-full table-fixed border-collapse border-frame border-ink bg-white">
        <caption className="sr-only">Torques of this step</caption>
        <thead>
          <tr>
            <th scope="col" className={`${HEAD} w-[30%] max-sm:w-[38%]`}>
              Fastener
            </th>
            <th scope="col" className={`${HEAD} w-[24%] max-sm:hidden`}>
              Thread, class
            </th>
            <th scope="col" className={HEAD}>
              N·m
            </th>
            <th scope="col" className={HEAD}>
              ±
            </th>
            <th scope="col" className={`${HEAD} w-[19%] max-sm:w-[27%]`}>
              Condition
            </th>
          </tr>
        </thead>
        {rows.map(({ entry, index }) => (
          <tbody key={`${entry['key']}:${index}`}>
            <tr>
              {TORQUE_FIELDS.map((field) => (
                <td key={field} className={CELL}>
                  <Cell list="torques" index={index} entry={entry} column={column('torques', field)} />
                </td>
              )).toSpliced(
                1,
                0,
                <td key="thread" className={`${CELL} max-sm:hidden`}>
                  <a
                    href="#torques"
                    className="block px-2.5 py-1.5 leading-snug text-ink"
                    title="Thread, order and the rest of it"
                  >
                    {threadOf(entry) || 'Fill in'}
                  </a>
                </td>,
              )}
            </tr>
            {boxesOf(entry['passes']).map((_, at) => (
              <tr key={at}>
                <th scope="row" className={`${CELL} px-2.5 text-left font-normal text-ink-2`}>
                  {PASS_WORDS[at]}
                </th>
                <td className={`${CELL} max-sm:hidden`} />
                <td className={CELL}>
                  <BoxCell
                    list="torques"
                    index={index}
                    entry={entry}
                    field="passes"
                    at={at}
                    label={`${PASS_WORDS[at]}, N·m`}
                  />
                </td>
                <td colSpan={2} className={CELL} />
              </tr>
            ))}
          </tbody>
        ))}
      </table>
      {rows.map(({ entry, index }) => (
        <RowProblems key={entry['key']} list="torques" index={index} fields={[...TORQUE_FIELDS, 'passes']} />
      ))}
    </div>
  );
}

function Limits({ keys }: { keys: readonly string[] }) {
  const { draft } = useDesk();
  const rows = draft.limits.flatMap((entry, index) => (keys.includes(entry['key'] ?? '') ? [{ entry, index }] : []));
  return (
    <table className="w-full table-fixed border-collapse border-frame border-ink bg-white">
      <caption className="sr-only">Limits of this step</caption>
      <thead>
        <tr>
          <th scope="col" className={`${HEAD} w-[44%] max-sm:w-[36%]`}>
            What is measured
          </th>
          {['Least', 'Nominal', 'Most', 'Unit'].map((label) => (
            <th key={label} scope="col" className={HEAD}>
              {label}
            </th>
          ))}
        </tr>
      </thead>
      {rows.map(({ entry, index }) => (
        <tbody key={`${entry['key']}:${index}`}>
          <tr>
            {(entry['quantity'] === 'finding' ? ['name'] : LIMIT_FIELDS).map((field) => (
              <td key={field} className={CELL}>
                <Cell list="limits" index={index} entry={entry} column={column('limits', field)} />
              </td>
            ))}
            {entry['quantity'] === 'finding' && (
              <td colSpan={4} className={CELL}>
                <Cell list="limits" index={index} entry={entry} column={column('limits', 'expect')} />
              </td>
            )}
          </tr>
          <tr>
            <td colSpan={5} className="p-0">
              <RowProblems list="limits" index={index} fields={[...LIMIT_FIELDS, 'expect']} />
            </td>
          </tr>
        </tbody>
      ))}
    </table>
  );
}

/** The torques and limits that a step points at, to be changed right here, with the other steps that use them. */
export function ValuesBehind({ body }: { body: string }) {
  const { draft } = useDesk();
  const known = (list: 'torques' | 'limits') =>
    keysIn(body, list).filter((key) => draft[list].some((entry) => entry['key'] === key));
  const torques = known('torques');
  const limits = known('limits');
  if (torques.length + limits.length === 0) return null;
  const steps = [
    ...new Set([
      ...torques.flatMap((key) => stepsUsing(draft, 'torques', key)),
      ...limits.flatMap((key) => stepsUsing(draft, 'limits', key)),
    ]),
  ].sort((a, b) => a - b);
  const one = torques.length + limits.length === 1;
  return (
    <section aria-label="The values behind it" className="flex flex-col gap-1.5">
      <h3 className="font-sans font-medium">
        {one ? 'The value' : 'The values'} behind it, used in {steps.length === 1 ? 'step' : 'steps'} {listed(steps)}
      </h3>
      <div className="values-behind flex flex-col gap-3">
        {torques.length > 0 && <Torques keys={torques} />}
        {limits.length > 0 && <Limits keys={limits} />}
      </div>
    </section>
  );
}
