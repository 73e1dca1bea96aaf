import { bandIfKnown, quantity, quantityIfKnown, rows } from '../fields';

const diameter = { above: 0, most: 2000 };
const dial = { least: -20, most: 20 };

export const fields = {
  bearings: rows(
    {
      bore: quantity('mm', { label: 'Bore', ...diameter }),
      shell: quantityIfKnown('mm', { label: 'Shell wall', above: 0, most: 50 }),
      journal: quantity('mm', { label: 'Journal', ...diameter }),
    },
    {
      label: 'Bearings',
      item: 'Bearing',
      hint: 'The bore with its cap tightened in full, in line with the bolts. Give the wall of a shell only where the bore was measured without shells.',
      least: 1,
      most: 24,
      start: 5,
    },
  ),
  forward: quantityIfKnown('mm', { label: 'Dial with the crankshaft pushed forward', ...dial }),
  back: quantityIfKnown('mm', { label: 'Dial with it pushed back', ...dial }),
  clearance: bandIfKnown('mm', { label: 'Oil clearance allowed' }),
  bore: bandIfKnown('mm', { label: 'Bearing bore allowed, shells in' }),
  journal: bandIfKnown('mm', { label: 'Journal allowed' }),
  play: bandIfKnown('mm', { label: 'End play allowed' }),
};
