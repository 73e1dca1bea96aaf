import { READINGS, WORKSHEET_KINDS, worksheetTitle } from '@/domain/procedure/worksheets';
import { PASS_WORDS, STAGE_WORDS } from '@/domain/writing/chipWords';
import { boxesOf, entryName, type Draft, type ListName } from '@/domain/writing/draft';
import type { Piece } from '@/domain/writing/insert';

/** Something that can be put into a step's words. */
export interface Choice {
  key: string;
  name: string;
  detail: string;
  piece: Piece;
}

const sentence = (text: string): Piece => ({ text, stands: 'sentence' });
const block = (text: string, select?: string): Piece => ({ text, stands: 'block', ...(select ? { select } : {}) });

const range = (min = '', max = '') =>
  min && max ? `${min} to ${max}` : min ? `${min} or more` : max ? `${max} or less` : '';

const torques = (draft: Draft): Choice[] =>
  draft.torques.flatMap((torque) => {
    const key = torque['key'] ?? '';
    const name = entryName('torques', torque);
    const passes = boxesOf(torque['passes']).flatMap((nm, i): Choice[] =>
      nm.trim()
        ? [
            {
              key: `${key} ${i + 1}`,
              name: `${name}, ${PASS_WORDS[i]}`,
              detail: `${nm} N·m`,
              piece: sentence(`<Torque of="${key}" pass="${i + 1}" />`),
            },
          ]
        : [],
    );
    const final = torque['tolerance'] ? `${torque['nm']} ±${torque['tolerance']} N·m` : `${torque['nm']} N·m`;
    return [...passes, { key, name, detail: torque['nm'] ? final : '', piece: sentence(`<Torque of="${key}" />`) }];
  });

const limits = (draft: Draft): Choice[] =>
  draft.limits.map((limit) => {
    const key = limit['key'] ?? '';
    const numbers = range(limit['min'], limit['max']) || (limit['nominal'] ?? '');
    return {
      key,
      name: entryName('limits', limit),
      detail: limit['expect'] || (numbers && `${numbers} ${limit['unit'] ?? ''}`),
      piece: sentence(`<Limit of="${key}" />`),
    };
  });

const timers = (draft: Draft): Choice[] => [
  ...draft.timers.map((timer) => ({
    key: timer['key'] ?? '',
    name: entryName('timers', timer),
    detail: timer['minutes'] ? `${timer['minutes']} min` : '',
    piece: sentence(`<Timer of="${timer['key']}" />`),
  })),
  ...draft.supplies.flatMap((supply) =>
    (
      [
        ['skin-over', 'skinOver'],
        ['cure', 'cure'],
      ] as const
    ).flatMap(([stage, field]): Choice[] =>
      supply[field]
        ? [
            {
              key: `${supply['key']} ${stage}`,
              name: `${entryName('supplies', supply)}, ${STAGE_WORDS[stage]}`,
              detail: `${supply[field]} min`,
              piece: sentence(`<Timer of="${supply['key']}" stage="${stage}" />`),
            },
          ]
        : [],
    ),
  ),
];

interface Offer {
  label: string;
  /** The component that they stand for. */
  component: string;
  list: ListName;
  choices: (draft: Draft) => Choice[];
}

/** What each button under the words offers: entries of the sheet by their names. */
export const CHOICES: readonly Offer[] = [
  { label: 'Torque', component: 'Torque', list: 'torques', choices: torques },
  { label: 'Limit', component: 'Limit', list: 'limits', choices: limits },
  {
    label: 'Part',
    component: 'Part',
    list: 'parts',
    choices: (draft) =>
      draft.parts.map((part) => ({
        key: part['key'] ?? '',
        name: entryName('parts', part),
        detail: part['quantity'] ?? '',
        piece: sentence(`<Part of="${part['key']}" />`),
      })),
  },
  { label: 'Timer', component: 'Timer', list: 'timers', choices: timers },
  {
    label: 'Drawing',
    component: 'Figure',
    list: 'figures',
    choices: (draft) =>
      draft.figures.map((figure) => ({
        key: figure['key'] ?? '',
        name: entryName('figures', figure),
        detail: '',
        piece: block(`<Figure of="${figure['key']}" />`),
      })),
  },
];

/** What can stand in the place of a component. */
export const choicesFor = (component: string): Offer | undefined => CHOICES.find((one) => one.component === component);

/** What goes in for an entry that was just made. */
export const PIECE_OF: Partial<Record<ListName, (key: string) => Piece>> = {
  torques: (key) => sentence(`<Torque of="${key}" />`),
  limits: (key) => sentence(`<Limit of="${key}" />`),
  parts: (key) => sentence(`<Part of="${key}" />`),
  timers: (key) => sentence(`<Timer of="${key}" />`),
  figures: (key) => block(`<Figure of="${key}" />`),
};

const HOLD_WORDS = 'A senior technician checks it before you go on.';
export const HOLD = block(`<Hold>${HOLD_WORDS}</Hold>`, HOLD_WORDS);

export const readingsOf = (keys: readonly string[]) => block(`<Worksheet kind="readings" of="${keys.join(' ')}" />`);

export const worksheets: Choice[] = WORKSHEET_KINDS.filter((kind) => kind !== READINGS).map((kind) => ({
  key: kind,
  name: worksheetTitle(kind) ?? kind,
  detail: '',
  piece: block(`<Worksheet kind="${kind}" />`),
}));
