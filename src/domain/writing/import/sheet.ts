import type { Nodes, PhrasingContent, Root, RootContent } from 'mdast';
import { visit } from 'unist-util-visit';
import type { LeftOut } from '../../api/schemas/imports';
import { ENGINE_TO_FILL_IN, fillIn } from '../../procedure/fillIn';
import { FrontmatterFields, type Caution } from '../../procedure/schema';
import { freeSlug } from '../ids';
import { joinSignals, takeCautions, type FoundCaution } from './cautions';
import { AVOID_TO_FILL_IN, HAZARD_TO_FILL_IN, saidCaution } from './cautionWords';
import { paragraphOf, textNode, tidy, wordsOf } from './nodes';
import { LONGEST_TITLE, outline } from './outline';
import { plainEntries } from './plainLists';
import { boldLine, leave, prose, words, type Taking } from './prose';
import { typedNumbers } from './typedNumbers';

/** A how-to as a sheet, before its prose is written out; nothing of it is checked yet. */
export interface DraftSheet {
  head: ReturnType<typeof FrontmatterFields.parse>;
  intro: RootContent[];
  steps: { id: string; title: string; cautions: string[]; children: RootContent[] }[];
  leftOut: LeftOut[];
}

export const TITLE_TO_FILL_IN = fillIn('which task it is.');
export const STEP_TO_FILL_IN = fillIn('what this step does.');
export const SUMMARY_TO_FILL_IN = fillIn(
  'what is done, and what comes out of it. Set the system, the engines, the bench time and the skill too; what stands there is only a start.',
);
const MOST_CAUTIONS = 30;

/** Words as one line of plain text; the address of a link among them is told. */
function line(nodes: readonly PhrasingContent[], c: Taking): string {
  const taken = words(nodes, c);
  for (const node of taken)
    if (node.type === 'link') leave(c, 'Address of a link', node.url, 'its words, without the link');
  return tidy(wordsOf(taken));
}

/** The cautions of a sheet, each once, with the steps that it stands before. */
class Cautions {
  readonly entries: Caution[] = [];
  readonly #byWords = new Map<string, string>();

  /** Key of the caution, or null where the sheet can hold no more; with what found no room in it. */
  take({ signal, words: nodes }: FoundCaution, c: Taking): { key: string | null; rest: string } {
    const text = line(nodes, c);
    const known = this.#byWords.get(`${signal} ${text}`);
    if (known !== undefined) {
      leave(c, 'Caution that is said again', `${signal} ${text}`, 'the same caution, once more');
      return { key: known, rest: '' };
    }
    if (this.entries.length >= MOST_CAUTIONS) {
      leave(c, 'Caution', '', `a paragraph: a sheet holds ${MOST_CAUTIONS} cautions`);
      return { key: null, rest: `${signal}: ${text}` };
    }
    const { rest, ...said } = saidCaution(signal, text);
    const named = [said.hazard, said.avoid].find((t) => t !== HAZARD_TO_FILL_IN && t !== AVOID_TO_FILL_IN);
    const key = freeSlug(
      (named ?? signal).split(' ').slice(0, 4).join(' '),
      this.entries.map((entry) => entry.key),
      signal.toLowerCase(),
    );
    this.entries.push({ key, ...said });
    this.#byWords.set(`${signal} ${text}`, key);
    return { key, rest };
  }
}

function definitionsIn(root: Root): Map<string, string> {
  const found = new Map<string, string>();
  visit(root, 'definition', ({ identifier, url }) => void (found.has(identifier) || found.set(identifier, url)));
  return found;
}

/** Makes a sheet of a how-to. Every word of the tree is then in the sheet or in `leftOut`. */
export function sheetOf(root: Root): DraftSheet {
  const leftOut: LeftOut[] = [];
  const definitions = definitionsIn(root);
  const at = (where: string): Taking => ({ leftOut, where, definitions });
  const found = outline(typedNumbers(joinSignals(root.children)));
  const titleLine = line(found.title, at('the title'));
  const title = titleLine && titleLine.length <= LONGEST_TITLE ? titleLine : TITLE_TO_FILL_IN;

  const introAt = at('the introduction');
  const lists = { parts: [], tools: [], supplies: [] } as Pick<DraftSheet['head'], 'parts' | 'tools' | 'supplies'>;
  for (const list of found.lists) {
    const entries = lists[list.kind].length === 0 ? plainEntries(list, introAt) : null;
    if (entries) Object.assign(lists, { [list.kind]: entries[list.kind] });
    else found.intro.push(boldLine(list.heading.children), ...list.blocks);
  }
  if (found.steps.length === 0) found.steps.push({ title: [], before: [], blocks: found.intro.splice(0), own: 0 });

  const cautions = new Cautions();
  const before = takeCautions(found.intro);
  const intro = prose(before.blocks, introAt);
  /** Cautions that stand before the next step, with the place that they came from. */
  let ahead = before.cautions.map((caution) => ({ caution, from: introAt }));
  const ids: string[] = [];
  const steps = found.steps.map(({ title: named, before: guards, blocks, own }, i) => {
    const text = line(named, at(`step ${i + 1}`));
    const stepTitle = text && text.length <= LONGEST_TITLE ? text.replace(/(?<=[^.])\.$/, '') : STEP_TO_FILL_IN;
    const c = at(`step ${i + 1}${stepTitle === STEP_TO_FILL_IN ? '' : `: ${stepTitle}`}`);
    const guarding = takeCautions(guards);
    const taken = takeCautions(blocks);
    const children = prose([...guarding.blocks, ...taken.blocks], c);
    const keys = [...ahead, ...[...guarding.cautions, ...taken.cautions].map((caution) => ({ caution, from: c }))].map(
      ({ caution, from }) => cautions.take(caution, from),
    );
    // One at the end of a step may guard what comes next, and nobody can tell: it stands before both.
    // The title of a numbered point is its work; a point without any work can only guard the next one.
    const worked = children.length > 0 || (own > 0 && text !== '');
    const none = children.length === 0 && text === '';
    const open = [...(none ? guarding.cautions : []), ...(worked || none ? taken.cautions : [])];
    ahead =
      i < found.steps.length - 1
        ? open.filter(({ trailing }) => trailing).map((caution) => ({ caution, from: { ...c, leftOut: [] } }))
        : [];
    const id = freeSlug(
      stepTitle === STEP_TO_FILL_IN ? wordsOf(children as Nodes[]).slice(0, 40) : stepTitle,
      ids,
      'step',
    );
    ids.push(id);
    return {
      id,
      title: stepTitle,
      cautions: [...new Set(keys.flatMap(({ key }) => key ?? []))],
      children: [...keys.flatMap(({ rest }) => (rest ? [paragraphOf(textNode(rest))] : [])), ...children],
    };
  });
  const head = FrontmatterFields.parse({
    title,
    summary: SUMMARY_TO_FILL_IN,
    system: 'checks',
    engines: [ENGINE_TO_FILL_IN],
    minutes: 60,
    skill: 'technician',
    ...lists,
    cautions: cautions.entries,
  });
  return { head, intro, steps, leftOut };
}
