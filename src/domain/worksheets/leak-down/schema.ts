import { bandIfKnown, choiceIfKnown, quantity, quantityIfKnown, rows } from '../fields';

export const fields = {
  supply: quantityIfKnown('kPa', {
    label: 'Supply pressure',
    hint: 'The first gauge, with the hose shut off. Not needed where the tester shows the loss itself.',
    above: 0,
    most: 2000,
  }),
  cylinders: rows(
    {
      pressure: quantityIfKnown('kPa', { label: 'Second gauge', least: 0, most: 2000 }),
      loss: quantityIfKnown('%', { label: 'or loss', least: 0, most: 100 }),
      heard: choiceIfKnown(
        [
          { value: 'intake', label: 'Intake' },
          { value: 'exhaust', label: 'Exhaust' },
          { value: 'crankcase', label: 'Oil filler' },
          { value: 'coolant', label: 'Coolant, bubbles' },
          { value: 'neighbour', label: 'Next plug hole' },
        ],
        { label: 'Air is heard at' },
      ),
    },
    {
      label: 'Cylinders',
      item: 'Cylinder',
      hint: 'At top dead centre, both valves shut: the pressure on the second gauge, or the loss where the tester shows that. Leave one that was not tested empty.',
      least: 1,
      most: 24,
      start: 4,
    },
  ),
  supplied: bandIfKnown('kPa', { label: 'Supply pressure allowed' }),
  loss: bandIfKnown('%', { label: 'Loss allowed' }),
  suspect: quantity('%', {
    label: 'Suspect from a loss of',
    hint: 'Where no limit is given. 25 % is published for aircraft and their tester, elsewhere common practice; a setting of the shop.',
    above: 0,
    most: 100,
    usual: 25,
  }),
  bore: quantityIfKnown('mm', {
    label: 'Bore of the cylinder',
    hint: 'To be told the orifice that the aircraft figure belongs to.',
    above: 0,
    most: 2000,
  }),
};
