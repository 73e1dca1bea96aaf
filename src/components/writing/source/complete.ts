import { autocompletion, startCompletion, type Completion, type CompletionSource } from '@codemirror/autocomplete';
import type { Known, Offer } from '@/domain/writing/source/offer';
import { offersAt } from '@/domain/writing/source/offersAt';

const completionOf = ({ label, detail, insert, caret }: Offer): Completion => ({
  label,
  detail,
  apply(view, _, from, to) {
    const text = insert ?? label;
    const at = from + (caret ?? text.length);
    view.dispatch({
      changes: { from, to, insert: text },
      selection: { anchor: at },
      scrollIntoView: true,
      userEvent: 'input.complete',
    });
    // Where a value is still to be filled in, what it can be is offered at once.
    if (insert !== undefined) startCompletion(view);
  },
});

/** Offers what our own registries and the text itself say can stand at the caret. */
export function completion(known: () => Known) {
  const source: CompletionSource = ({ state, pos, explicit }) => {
    const found = offersAt(state.doc.toString(), pos, known());
    // On an empty line there is nothing to go by; there it is offered when it is asked for.
    if (!found || (!explicit && found.from === pos && !/[<"\s:-]$/.test(state.sliceDoc(Math.max(0, pos - 1), pos))))
      return null;
    if (!explicit && state.doc.lineAt(pos).text.trim() === '') return null;
    return { from: found.from, options: found.offers.map(completionOf), validFor: /^[\w.-]*$/ };
  };
  // They stand in the order of the sheet and of the registries, not of the alphabet.
  return autocompletion({ override: [source], icons: false, compareCompletions: () => 0, maxRenderedOptions: 60 });
}
