import { worked } from '@/domain/measure/worked';
import {
  band,
  bandIfKnown,
  choice,
  choiceIfKnown,
  number,
  numberIfKnown,
  quantity,
  quantityIfKnown,
  rows,
  text,
  textIfKnown,
} from '@/domain/worksheets/fields';
import { worksheet, type Worksheet } from '@/domain/worksheets/worksheet';

/** A made-up worksheet's fields with everything that a field can be, so that the shared parts are tested whatever is registered. */
export const SAMPLE = {
  depth: quantity('mm', { label: 'Depth read', above: 0, most: 500 }),
  heat: quantityIfKnown('°C', { label: 'Oil temperature', least: -40, most: 200 }),
  deviation: quantity('%', { label: 'Deviation allowed', usual: 3, least: 0, most: 50 }),
  gap: quantity('mm', { label: 'Gap allowed', usual: 0.05, above: 0 }),
  flow: quantityIfKnown('cc/min', { label: 'Nominal flow', above: 0, density: 'density' }),
  density: numberIfKnown({ label: 'Density', above: 0, most: 25_000, after: 'kg/m³' }),
  cylinders: number({ label: 'Cylinders', whole: true, least: 1, most: 16 }),
  factor: number({ label: 'Nut factor', usual: 0.2, above: 0, most: 1 }),
  side: choice(
    [
      { value: 'left', label: 'Left' },
      { value: 'right', label: 'Right' },
    ],
    { label: 'Side', usual: 'right' },
  ),
  stroke: choice([{ value: 'two', label: 'Two' }], { label: 'Stroke' }),
  fuel: choiceIfKnown([{ value: 'petrol', label: 'Petrol' }], { label: 'Fuel' }),
  engine: text({ label: 'Engine', most: 12 }),
  note: textIfKnown({ label: 'Note', most: 12 }),
  limit: band('mm', { label: 'Clearance' }),
  warmth: bandIfKnown('°C', { label: 'Warm range' }),
  injectors: rows(
    {
      before: quantity('cc/min', { label: 'Before cleaning', least: 0, density: 'density' }),
      after: quantityIfKnown('cc/min', { label: 'After cleaning', least: 0, density: 'density' }),
      spray: choiceIfKnown([{ value: 'good', label: 'Good' }], { label: 'Spray' }),
      leak: choice([{ value: 'none', label: 'None' }], { label: 'Leak' }),
    },
    { label: 'Injectors', item: 'Injector', least: 2, most: 6, start: 4 },
  ),
};

/** What fills every box that must be filled. */
export const FILLED = {
  depth: '12',
  cylinders: '4',
  engine: 'T18F',
  limit: { min: '0.02', max: '0.05' },
  injectors: [{ before: '250' }, { before: '252' }],
};

/** A worksheet of these fields that answers with the rules of thumb that it was given. */
export const SAMPLE_WORKSHEET = worksheet({
  name: 'sample',
  title: 'Sample',
  summary: 'Says which rules of thumb it went by.',
  fields: SAMPLE,
  groups: [{ title: 'All', fields: Object.keys(SAMPLE) as (keyof typeof SAMPLE)[] }],
  example: { depth: '12', cylinders: '4', engine: 'T18F', 'limit.max': '0.05', 'injectors.0.before': '250' },
  compute: ({ deviation, gap, factor }) =>
    worked({
      verdict: 'none',
      reasons: [],
      charts: [],
      results: Object.entries({ deviation, gap, factor }).map(([key, value]) => ({
        key,
        label: key,
        value,
        unit: null,
        text: { metric: String(value), inch: String(value) },
      })),
    }),
}) as unknown as Worksheet;
