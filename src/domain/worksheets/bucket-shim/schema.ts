import { bandIfKnown, choice, quantity, quantityIfKnown, rows } from '../fields';

const shim = { above: 0, most: 20 };
const lash = { least: 0, most: 5 };

export const fields = {
  valves: rows(
    {
      side: choice(
        [
          { value: 'intake', label: 'Intake' },
          { value: 'exhaust', label: 'Exhaust' },
        ],
        { label: 'Side' },
      ),
      lash: quantity('mm', { label: 'Lash measured', ...lash }),
      shim: quantityIfKnown('mm', { label: 'Shim that is in', ...shim }),
    },
    {
      label: 'Valves',
      item: 'Valve',
      hint: 'Cold, the lobe pointing away. The shim is needed only where the lash is out of limits.',
      least: 1,
      most: 48,
      start: 8,
    },
  ),
  intake: bandIfKnown('mm', { label: 'Lash allowed, intake', nominal: 'intakeWanted' }),
  intakeWanted: quantityIfKnown('mm', {
    label: 'Lash wanted, intake',
    hint: 'Else the middle of the limits.',
    ...lash,
  }),
  exhaust: bandIfKnown('mm', { label: 'Lash allowed, exhaust', nominal: 'exhaustWanted' }),
  exhaustWanted: quantityIfKnown('mm', {
    label: 'Lash wanted, exhaust',
    hint: 'Else the middle of the limits.',
    ...lash,
  }),
  stock: bandIfKnown('mm', { label: 'Shims in stock', hint: 'The thinnest and the thickest.' }),
  step: quantity('mm', {
    label: 'Step between shims in stock',
    hint: 'Common practice, no standard; the parts list says.',
    above: 0,
    most: 1,
    usual: 0.05,
  }),
};
