import { lowered } from '@/domain/wording';
import type { Round } from './orderPasses';

/**
 * Steps through a tightening order on its drawing, one bolt at a time and one round at a time. The drawing, its numbers and
 * its list in words stand without it.
 *
 * @param figure with `data-order` (JSON of the rounds), circles under `[data-turn]` in turn from 1
 */
export function stepThrough(figure: HTMLElement): void {
  const bolts = [...figure.querySelectorAll<SVGGElement>('[data-turn]')];
  const controls = figure.querySelector<HTMLElement>('[data-order-steps]');
  if (bolts.length === 0 || !controls) return;
  const rounds = JSON.parse(figure.dataset['order'] ?? '[]') as Round[];
  const total = bolts.length * Math.max(1, rounds.length);
  /** How many tightenings are done and under way; 0 before the first. */
  let at = 0;

  const button = (text: string, move: () => number) => {
    const made = document.createElement('button');
    made.type = 'button';
    made.className = 'order-step';
    made.textContent = text;
    made.addEventListener('click', () => show(move()));
    return made;
  };
  const said = document.createElement('p');
  said.setAttribute('role', 'status');
  said.className = 'order-said';
  const back = button('Back', () => at - 1);
  const next = button('Step through', () => (at === total ? 0 : at + 1));
  controls.replaceChildren(back, next, said);

  function show(to: number): void {
    at = Math.max(0, Math.min(total, to));
    const turn = at === 0 ? 0 : ((at - 1) % bolts.length) + 1;
    const round = rounds[Math.floor((at - 1) / bolts.length)];
    for (const bolt of bolts) {
      const own = Number(bolt.dataset['turn']);
      bolt.dataset['state'] = at === 0 ? '' : own === turn ? 'now' : own < turn ? 'done' : 'next';
    }
    back.hidden = at === 0;
    next.textContent = at === 0 ? 'Step through' : at === total ? 'Start again' : 'Next bolt';
    const bolt = `Bolt ${turn} of ${bolts.length}`;
    said.replaceChildren(
      ...(at === 0 ? [] : [round ? `${bolt}, ${lowered(round.name)} ` : bolt, ...(round ? values(round) : [])]),
    );
    if (at === total) said.append('. That was the last.');
  }
  show(0);
}

/** The round's value in both unit systems; the page shows the reader's. */
function values({ text }: Round): Node[] {
  return (['metric', 'inch'] as const).map((system) => {
    const value = document.createElement('b');
    value.dataset['units'] = system;
    value.textContent = text[system];
    return value;
  });
}
