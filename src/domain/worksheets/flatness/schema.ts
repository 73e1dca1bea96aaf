import { bandIfKnown, choice, quantity, quantityIfKnown, rows } from '../fields';

const place = { least: -5000, most: 5000 };

export const fields = {
  gaps: rows(
    {
      direction: choice(
        [
          { value: 'along', label: 'Along' },
          { value: 'across', label: 'Across' },
          { value: 'diagonal', label: 'Diagonal' },
        ],
        { label: 'Straightedge lies' },
      ),
      gap: quantity('mm', { label: 'Thickest blade', least: 0, most: 50 }),
      span: quantityIfKnown('mm', { label: 'Between its rests', above: 0, most: 5000 }),
    },
    {
      label: 'Gaps under the straightedge',
      item: 'Gap',
      hint: 'The thickest blade that goes under; 0 where none does. How far apart the straightedge rests is needed only for a limit in a stretch.',
      least: 0,
      most: 24,
      start: 6,
    },
  ),
  points: rows(
    {
      x: quantity('mm', { label: 'Along', ...place }),
      y: quantity('mm', { label: 'Across', ...place }),
      height: quantity('mm', { label: 'Dial', least: -50, most: 50 }),
    },
    {
      label: 'Heights on a plate',
      item: 'Point',
      hint: 'Instead of a straightedge: four points or more that do not lie on one line.',
      least: 0,
      most: 64,
      start: 4,
    },
  ),
  every: bandIfKnown('mm', { label: 'Allowed in every direction', hint: 'Where a direction has no limit of its own.' }),
  along: bandIfKnown('mm', { label: 'Allowed along' }),
  across: bandIfKnown('mm', { label: 'Allowed across' }),
  diagonal: bandIfKnown('mm', { label: 'Allowed diagonally' }),
  local: bandIfKnown('mm', { label: 'Allowed in any stretch' }),
  over: quantityIfKnown('mm', {
    label: 'Length of that stretch',
    hint: '150 mm for 0.05 mm in 150 mm.',
    above: 0,
    most: 5000,
  }),
  whole: bandIfKnown('mm', { label: 'Allowed over the whole face, by heights' }),
};
