import { bandIfKnown, choiceIfKnown, number, numberIfKnown, quantity, quantityIfKnown, rows } from '../fields';

const flow = { least: 0, most: 50_000, density: 'density' };

export const fields = {
  nominal: quantity('cc/min', {
    label: 'Nominal flow',
    hint: 'Of a good injector of this number, at the pressure of the bench.',
    above: 0,
    most: 50_000,
    density: 'density',
  }),
  injectors: rows(
    {
      before: quantityIfKnown('cc/min', { label: 'Before', ...flow }),
      after: quantityIfKnown('cc/min', { label: 'After', ...flow }),
      drops: numberIfKnown({ label: 'Drops', whole: true, least: 0, most: 1000 }),
      spray: choiceIfKnown(
        [
          { value: 'even', label: 'Even' },
          { value: 'one-sided', label: 'One-sided' },
          { value: 'streams', label: 'Streams' },
          { value: 'none', label: 'None' },
        ],
        { label: 'Spray' },
      ),
    },
    {
      label: 'Injectors',
      item: 'Injector',
      hint: 'Flow held open, before and after cleaning, in one run each; drops while it is held shut under pressure.',
      least: 1,
      most: 24,
      start: 4,
    },
  ),
  flow: bandIfKnown('cc/min', { label: 'Flow allowed', nominal: 'nominal' }),
  spread: bandIfKnown('%', { label: 'Spread of the set allowed', hint: 'Highest less lowest, over the mean.' }),
  drops: bandIfKnown('drops', { label: 'Drops allowed' }),
  deviation: quantity('%', {
    label: 'Deviation from nominal allowed, either way',
    hint: 'Common practice, no published figure; a setting of the shop.',
    above: 0,
    most: 50,
    usual: 5,
  }),
  matching: quantity('%', {
    label: 'Spread of the set allowed by rule',
    hint: 'Common practice, no published figure; a setting of the shop.',
    above: 0,
    most: 100,
    usual: 3,
  }),
  benchPressure: quantityIfKnown('kPa', { label: 'Pressure across the injector on the bench', above: 0, most: 50_000 }),
  runPressure: quantityIfKnown('kPa', {
    label: 'Pressure across it in the engine',
    hint: 'Rail less manifold.',
    above: 0,
    most: 50_000,
  }),
  density: number({
    label: 'Density of the fuel',
    hint: 'Common practice for petrol at 15 °C. Also joins cc/min and lb/h.',
    above: 0,
    most: 2000,
    after: 'kg/m³',
    usual: 745,
  }),
  duty: quantity('%', {
    label: 'Duty at full power, at most',
    hint: 'Common practice, no published figure.',
    above: 0,
    most: 100,
    usual: 80,
  }),
  bsfc: quantity('g/kWh', {
    label: 'Fuel used for the work at full power',
    hint: '0.50 lb/(hp·h) is 304 g/kWh; engines under boost use a fifth to a third more. Common practice.',
    above: 0,
    most: 5000,
    usual: 304,
  }),
};
