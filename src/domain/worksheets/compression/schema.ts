import { bandIfKnown, choice, numberIfKnown, quantity, quantityIfKnown, rows } from '../fields';

const pressure = { least: 0, most: 20_000 };

export const fields = {
  cylinders: rows(
    {
      dry: quantity('kPa', { label: 'Dry', ...pressure }),
      wet: quantityIfKnown('kPa', { label: 'With oil', ...pressure }),
    },
    {
      label: 'Readings',
      item: 'Cylinder',
      hint: 'Warm, throttle wide open, the same number of puffs for each. With oil only where a low one was repeated.',
      least: 1,
      most: 24,
      start: 4,
    },
  ),
  layout: choice(
    [
      { value: 'line', label: 'In line, numbered from one end' },
      { value: 'other', label: 'Any other' },
    ],
    { label: 'Cylinders stand', hint: 'Tells which are neighbours over the gasket.' },
  ),
  scale: choice(
    [
      { value: 'gauge', label: 'In the open it shows zero' },
      { value: 'absolute', label: 'In the open it shows the air' },
    ],
    { label: 'The gauge', hint: 'A transducer may count from vacuum.' },
  ),
  altitude: numberIfKnown({
    label: 'Altitude of the shop',
    hint: 'Readings are then corrected to sea level before they are judged.',
    least: -500,
    most: 6000,
    after: 'm',
  }),
  air: quantityIfKnown('kPa', {
    label: 'Air pressure in the shop',
    hint: 'By a barometer that is not set to sea level; better than the altitude.',
    least: 40,
    most: 120,
  }),
  compression: bandIfKnown('kPa', { label: 'Compression allowed', nominal: 'nominal' }),
  nominal: quantityIfKnown('kPa', { label: 'Compression when new', above: 0, most: 20_000 }),
  share: bandIfKnown('%', { label: 'Lowest as a share of the highest allowed' }),
  rule: choice(
    [
      { value: 'share', label: 'Lowest against highest' },
      { value: 'average', label: 'Each against the average' },
      { value: 'difference', label: 'Between any two' },
    ],
    {
      label: 'Where no share is given, compare',
      hint: 'Manuals differ; these three are published, and do not agree. A rule that is missed only asks to look again.',
    },
  ),
  leastShare: quantity('%', {
    label: 'Lowest, of the highest, at least',
    hint: 'Published in one manual, and common practice; a setting of the shop.',
    above: 0,
    most: 100,
    usual: 75,
  }),
  mostBelow: quantity('%', {
    label: 'Below the average, at most',
    hint: 'Published for aircraft, elsewhere common practice; a setting of the shop.',
    least: 0,
    most: 100,
    usual: 20,
  }),
  mostDifference: quantity('kPa', {
    label: 'Between any two, at most',
    hint: '10 psi, published in one manual, elsewhere common practice; a setting of the shop.',
    least: 0,
    most: 5000,
    usual: 68.95,
  }),
  rise: quantity('%', {
    label: 'Rise with oil that points to the rings',
    hint: 'Common practice, no published number.',
    above: 0,
    most: 200,
    usual: 10,
  }),
};
