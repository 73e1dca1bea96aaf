import { bandIfKnown, choice, quantity, quantityIfKnown } from '../fields';

const reading = { least: -1000, most: 5000 };

export const fields = {
  bar: quantity('mm', {
    label: 'Thickness of the bar',
    hint: 'Measured, before there is a reading to go with it.',
    above: 0,
    most: 500,
  }),
  from: choice(
    [
      { value: 'bar-top', label: 'Stands on top of the bar' },
      { value: 'face', label: 'Was set to zero over the bar' },
    ],
    { label: 'The gauge', hint: 'On top, the bar is in every reading. Set to zero on bar and plate, it is in none.' },
  ),
  zero: quantityIfKnown('mm', {
    label: 'What the gauge shows on its master',
    hint: 'Where it should show zero; it comes off. 0 where left out.',
    least: -100,
    most: 100,
  }),
  direction: choice(
    [
      { value: 'below', label: 'Below the face' },
      { value: 'above', label: 'Above the face, standing proud' },
    ],
    { label: 'Distance wanted' },
  ),
  reading: quantity('mm', { label: 'Reading', ...reading }),
  facing: quantityIfKnown('mm', {
    label: 'Reading from the face that meets it',
    hint: 'With the same bar and gauge, where the two depths add up over a joint: rail to rod, flange to oil.',
    ...reading,
  }),
  thickness: bandIfKnown('mm', { label: 'Thickness of the bar allowed' }),
  distance: bandIfKnown('mm', { label: 'Distance allowed' }),
  facingDistance: bandIfKnown('mm', { label: 'Distance from the face that meets it allowed' }),
  total: bandIfKnown('mm', { label: 'Both distances together allowed' }),
};
