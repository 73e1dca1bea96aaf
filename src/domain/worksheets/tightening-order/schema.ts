import { choice, quantity, quantityIfKnown, rows, textIfKnown } from '../fields';

export const fields = {
  positions: rows(
    {
      x: quantity('mm', { label: 'To the right', least: -5000, most: 5000 }),
      y: quantity('mm', { label: 'Down', least: -5000, most: 5000 }),
    },
    {
      label: 'Where the bolts stand',
      hint: 'Seen from their heads, from any corner. Only the proportions count.',
      item: 'Bolt',
      least: 2,
      most: 40,
      start: 6,
    },
  ),
  order: textIfKnown({
    label: 'Order to look over',
    hint: 'Bolt numbers in the order they are tightened: 3 8 2 7 4 9.',
    most: 60,
  }),
  final: quantityIfKnown('N·m', { label: 'Final torque', hint: 'For the torque of each pass.', above: 0, most: 2000 }),
  passes: choice(
    [
      { value: 'flange', label: '30, 60, 100 %' },
      { value: 'two', label: '70, 100 %' },
      { value: 'one', label: '100 % at once' },
    ],
    { label: 'Passes', hint: 'What the sheet says comes first.' },
  ),
};
