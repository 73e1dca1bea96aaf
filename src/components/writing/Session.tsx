import { useDeferredValue, useEffect, useMemo, useState } from 'react';
import { FormProvider, useForm, useWatch } from 'react-hook-form';
import { useThreads } from '@/components/threads/useThreads';
import type { Thread } from '@/domain/api/schemas/threads';
import { plainLines } from '@/domain/procedure/source';
import type { Draft } from '@/domain/writing/draft';
import { procedureOf } from '@/domain/writing/procedureOf';
import { emptyDraft, readDraft, sourceOf } from '@/domain/writing/readDraft';
import { DeskContext, type Desk } from './desk';
import { DeskFrame } from './DeskFrame';
import type { Words } from '@/domain/writing/textChanges';
import { fieldId, placeOfChange, placeOfProblem } from './places';
import { useCheck } from './useCheck';
import { useKeepUp } from './useKeepUp';
import { useMerging } from './useMerging';
import { useKeeping } from './useKeeping';
import { useChanges } from './useNeeds';
import { focusSoon, usePlace } from './usePlace';
import { setAside } from './api';
import { useProposing } from './useProposing';
import { useUndoing } from './useUndoing';
import type { WritingProps } from './writingProps';
import { REASON_ID } from './ReasonField';

/** One sitting at the desk: the form, what keeps it, what checks it, and what may be done with it. */
export function Session({ proposal, threads, source, base, current, engines, drawings, said }: WritingProps) {
  const [first] = useState(() => {
    const draft = readDraft(source, proposal.reason);
    return { draft: draft ?? { ...emptyDraft(), reason: proposal.reason }, text: draft ? null : source };
  });
  const form = useForm<Draft>({ defaultValues: first.draft });
  const [text, setText] = useState(first.text);
  const draft = useWatch({ control: form.control }) as Draft;
  const late = useDeferredValue(draft);
  const procedure = useMemo(() => (text === null ? procedureOf(late) : null), [late, text]);
  const words = useMemo<Words>(() => ({ source: text ?? sourceOf(late), reason: late.reason }), [late, text]);
  const baseDraft = useMemo(() => (base ? readDraft(base.source) : null), [base]);
  const baseProcedure = useMemo(() => baseDraft && procedureOf(baseDraft), [baseDraft]);

  const [undo, setUndo] = useState<{ said: string; act: (() => void) | null } | null>(
    said ? { said, act: null } : null,
  );
  useEffect(() => {
    // It is said once: a page that loads again must not say it of something else.
    if (said) history.replaceState(history.state, '', location.pathname + location.hash);
  }, [said]);
  const { place, choose } = usePlace(draft);
  const undoing = useUndoing(draft, form.getValues, text === null, (shown, path) => {
    form.reset(shown, { keepTouched: true });
    // What was offered to be brought back may stand there again by now.
    setUndo(null);
    const there = placeOfChange(path, shown);
    if (there) choose(there);
  });
  const load = (next: Words) => {
    const read = readDraft(next.source, next.reason);
    if (read) {
      form.reset(read);
      // Where the form showed nothing before, there is nothing in it that could be shown again.
      if (first.text !== null && text !== null) undoing.restart(read);
    } else form.setValue('reason', next.reason);
    setText(read ? null : next.source);
  };
  const latest = (): Words => ({ source: text ?? sourceOf(form.getValues()), reason: form.getValues('reason') });
  const { keeper, state } = useKeeping(
    proposal,
    { source: plainLines(first.text ?? sourceOf(first.draft)), reason: proposal.reason },
    latest,
    (found) => {
      load(found);
      setUndo({ said: 'Words that were held on this device are back on the screen.', act: null });
    },
  );
  useKeepUp(keeper, words);

  const checked = useCheck(words.source, procedure);
  const sound = procedure !== null && !checked.problems.some((p) => !/^(steps|intro)/.test(p.path ?? ''));
  const changes = useChanges(words.source, baseProcedure, sound ? procedure : null);
  const [tried, setTried] = useState(false);
  const { pending, refusal, setRefusal, propose, rebase } = useProposing(proposal.id, keeper);

  const talk = useThreads(proposal.id, threads);
  const accept = async (thread: Thread) => {
    keeper.change(latest());
    if (!(await keeper.flush())) {
      const detail = 'The draft could not be kept yet, so nothing was taken up. Try again once it is.';
      talk.setTrouble({ thread: thread.id, field: null, detail });
      return;
    }
    const taken = await talk.accept(thread, keeper.version);
    if (!taken) return;
    keeper.moved(taken.version);
    location.reload();
  };
  const mine = useMemo(() => {
    if (procedure) return sound ? procedure : null;
    const read = checked.problems.length === 0 && text !== null ? readDraft(text) : null;
    return read && procedureOf(read);
  }, [procedure, sound, checked.problems.length, text]);
  const merging = useMerging(proposal.id, base, current, mine, rebase);

  const goTo = (path: string) => {
    setTried(true);
    choose(placeOfProblem(path, draft));
    const parts = path.split('.');
    focusSoon(
      fieldId(path),
      parts.map((_, i) => fieldId(parts.slice(0, parts.length - i).join('.'))).concat('writing-middle'),
    );
  };
  const ask = () => {
    setTried(true);
    const [fault] = [...checked.problems, ...checked.toFillIn];
    if (fault) {
      const what = checked.problems.length > 0 ? 'mend' : 'fill in';
      setRefusal({ detail: `Something is to ${what} before it can be proposed.`, errors: [] });
      if (fault.path) goTo(fault.path);
    } else if (!form.getValues('reason').trim()) focusSoon(REASON_ID);
    else {
      keeper.change(latest());
      void propose();
    }
  };

  const desk: Desk = {
    draft,
    base: baseDraft,
    baseLetter: base?.letter ?? null,
    engines,
    drawings,
    problems: checked.problems,
    remarks: proposal.state === 'returned' ? proposal.remarks.filter((remark) => remark.kind === 'returned') : [],
    threads: proposal.state === 'returned' ? talk.list.items.filter(({ state: stands }) => stands === 'open') : [],
    talk: { ...talk, accept: (thread) => void accept(thread) },
    asText: text !== null,
    tried,
    place,
    choose,
    goTo,
    focusSoon,
    offerUndo: (said, act) => setUndo({ said, act }),
  };
  return (
    <FormProvider {...form}>
      <DeskContext value={desk}>
        <DeskFrame
          proposal={proposal}
          current={current}
          state={state}
          checked={checked}
          changes={changes}
          refusal={refusal}
          pending={pending}
          undo={undo}
          onUndone={() => setUndo(null)}
          undoing={undoing}
          onVersions={() => {
            keeper.change(latest());
            void keeper.flush().finally(() => location.assign(`/proposals/${proposal.id}/versions`));
          }}
          onPropose={ask}
          merging={merging}
          mine={words.source}
          text={text}
          onText={setText}
          onForm={() => {
            const read = readDraft(text ?? '', draft.reason);
            if (read) load({ source: text ?? '', reason: draft.reason });
            else void keeper.flush().then((kept) => kept && location.reload());
          }}
          onTheirs={() => {
            const taken = keeper.takeTheirs();
            if (!taken) return;
            load(taken.set);
            // Where that fails it can still be put back from the line that says so.
            if (taken.unsaved) void setAside(proposal.id, taken.aside).catch(() => {});
            setUndo({
              said: 'What was saved elsewhere is on the screen. Yours is kept among the earlier versions.',
              act: () => load(taken.aside),
            });
          }}
          onMine={() => void keeper.keepMine()}
        />
      </DeskContext>
    </FormProvider>
  );
}
