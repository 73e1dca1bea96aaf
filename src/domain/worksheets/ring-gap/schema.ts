import { bandIfKnown, numberIfKnown, quantityIfKnown, rows } from '../fields';

const gap = { least: 0, most: 20 };
const diameter = { above: 0, most: 2000 };

export const fields = {
  cylinders: rows(
    {
      top: quantityIfKnown('mm', { label: 'Top ring', ...gap }),
      second: quantityIfKnown('mm', { label: 'Second ring', ...gap }),
      upper: quantityIfKnown('mm', { label: 'Upper rail', ...gap }),
      lower: quantityIfKnown('mm', { label: 'Lower rail', ...gap }),
    },
    {
      label: 'End gaps',
      item: 'Cylinder',
      hint: 'Each ring square in its own bore. Leave a ring that was not measured empty.',
      least: 1,
      most: 24,
      start: 4,
    },
  ),
  top: bandIfKnown('mm', { label: 'Gap allowed, top ring' }),
  second: bandIfKnown('mm', { label: 'Gap allowed, second ring' }),
  rail: bandIfKnown('mm', { label: 'Gap allowed, oil rails' }),
  bore: quantityIfKnown('mm', { label: 'Bore that the rings will run in', ...diameter }),
  factor: numberIfKnown({
    label: 'Gap for each unit of bore, top ring',
    hint: "The ring maker's factor for the use of the engine, such as 0.004; the same in millimetres and in inches.",
    above: 0,
    most: 0.1,
  }),
  measuredIn: quantityIfKnown('mm', {
    label: 'Bore that the gaps were measured in',
    hint: 'Only where that was another bore than the one they will run in, such as a ring gauge.',
    ...diameter,
  }),
};
