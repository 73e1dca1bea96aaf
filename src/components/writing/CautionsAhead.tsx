import { useController } from 'react-hook-form';
import { SignalWord } from '@/components/sheet/SignalPanel';
import { Button } from '@/components/ui/Button';
import type { Caution } from '@/domain/procedure/schema';
import { entryName } from '@/domain/writing/draft';
import { problemAt } from '@/domain/writing/problems';
import { useDesk, useDraftForm } from './desk';
import { Menu, MenuItem } from './Menu';
import { NewEntry } from './NewEntry';
import { fieldId } from './places';
import { useEntries } from './useEntries';

const SIGNALS = ['DANGER', 'WARNING', 'CAUTION', 'NOTICE'];
const isSignal = (text: string | undefined): text is Caution['signal'] => SIGNALS.includes(text ?? '');

/** Keys of the cautions ahead of a step. */
function useAhead(index: number) {
  const { control } = useDraftForm();
  const { field } = useController({ control, name: `steps.${index}.cautions` });
  const ahead: string[] = Array.isArray(field.value) ? field.value : [];
  return { ahead, set: (keys: string[]) => field.onChange(keys) };
}

/** The cautions that stand ahead of a step, in their order, and a way to put another one there. */
export function CautionsAhead({ index }: { index: number }) {
  const { draft, problems } = useDesk();
  const path = `steps.${index}.cautions` as const;
  const { ahead, set } = useAhead(index);
  const error = problemAt(problems, path);
  if (ahead.length === 0 && !error) return null;
  return (
    <section
      id={fieldId(path)}
      tabIndex={-1}
      aria-label="Cautions ahead of this step"
      className="flex flex-col gap-1.5"
    >
      <h3 className="font-sans font-medium">Cautions ahead of it</h3>
      {ahead.length > 0 && (
        <ol className="divide-y divide-ink border-frame border-ink">
          {ahead.map((key, at) => {
            const caution = draft.cautions.find((one) => one['key'] === key);
            const signal = caution?.['signal'];
            const name = caution ? entryName('cautions', caution) : `${key} (not among the cautions)`;
            return (
              <li key={key} className="grid items-stretch bg-white sm:grid-cols-[8rem_minmax(0,1fr)_auto]">
                {isSignal(signal) ? <SignalWord signal={signal} /> : <span className="px-3 py-2">No signal word</span>}
                <a href="#cautions" className="self-center px-3 py-2 text-ink">
                  {name}
                </a>
                <span className="flex">
                  {at > 0 && (
                    <Button
                      kind="quiet"
                      className="text-small"
                      aria-label={`Move up: ${name}`}
                      onClick={() => set(ahead.toSpliced(at - 1, 2, key, ahead[at - 1] ?? ''))}
                    >
                      Up
                    </Button>
                  )}
                  <Button
                    kind="quiet"
                    className="text-small"
                    aria-label={`Take away: ${name}`}
                    onClick={() => set(ahead.filter((other) => other !== key))}
                  >
                    Take away
                  </Button>
                </span>
              </li>
            );
          })}
        </ol>
      )}
      {error && <p className="border-l-[8px] border-ink pl-2.5 font-medium leading-snug">{error}</p>}
    </section>
  );
}

/** Puts another of the sheet's cautions, or a new one, ahead of a step. */
export function CautionMenu({ index }: { index: number }) {
  const { draft, choose } = useDesk();
  const { ahead, set } = useAhead(index);
  const { add } = useEntries('cautions');
  const others = draft.cautions.filter((caution) => !ahead.includes(caution['key'] ?? ''));
  return (
    <Menu label="Caution">
      {(close) => (
        <>
          {others.map((caution) => (
            <MenuItem
              key={caution['key']}
              detail={caution['signal'] ?? ''}
              onChoose={() => {
                close();
                set([...ahead, caution['key'] ?? '']);
              }}
            >
              {entryName('cautions', caution)}
            </MenuItem>
          ))}
          <div className="px-3.5 py-2" data-item={others.length === 0 ? '' : undefined} tabIndex={-1}>
            <NewEntry
              list="cautions"
              onAdd={(name) => {
                const key = add(name);
                close();
                set([...ahead, key]);
                choose({ list: 'cautions' });
              }}
            />
          </div>
        </>
      )}
    </Menu>
  );
}
