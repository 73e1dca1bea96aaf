import { bandIfKnown, choice, quantity, quantityIfKnown, rows } from '../fields';

const diameter = { above: 0, most: 2000 };

export const fields = {
  heights: rows(
    {
      thrust: quantity('mm', { label: 'Across the thrust faces', ...diameter }),
      along: quantity('mm', { label: 'Along the crankshaft', ...diameter }),
    },
    {
      label: 'Diameters',
      item: 'Height',
      hint: 'Two or three heights, the top first, all within the sweep of the rings.',
      least: 2,
      most: 3,
      start: 3,
    },
  ),
  nominal: quantityIfKnown('mm', { label: 'Bore when new', hint: 'Wear is counted from it.', ...diameter }),
  piston: quantityIfKnown('mm', {
    label: 'Piston diameter',
    hint: 'Measured where its maker says, square to the pin.',
    ...diameter,
  }),
  taperRule: choice(
    [
      { value: 'range', label: 'Largest less smallest on one axis' },
      { value: 'ends', label: 'Top less bottom on one axis' },
    ],
    { label: 'Taper is', hint: 'Manuals differ; the first is never the smaller.' },
  ),
  diameter: bandIfKnown('mm', { label: 'Bore diameter allowed', nominal: 'nominal' }),
  taper: bandIfKnown('mm', { label: 'Taper allowed' }),
  roundness: bandIfKnown('mm', { label: 'Out-of-round allowed' }),
  clearance: bandIfKnown('mm', {
    label: 'Piston clearance allowed',
    hint: 'Of the smallest reading less the piston.',
  }),
};
