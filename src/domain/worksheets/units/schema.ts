import { numberIfKnown, text } from '../fields';

export const fields = {
  measure: text({
    label: 'Measure',
    hint: 'A number with its unit: 89 lbf·in, 14 thou, 3/8 in, 2.5 bar, 180 °F.',
    most: 40,
  }),
  density: numberIfKnown({
    label: 'Density of the fluid',
    hint: 'Only between a volume and a mass in a time, such as cc/min and lb/h. Petrol is about 745 kg/m³ at 15 °C.',
    above: 0,
    most: 25_000,
    after: 'kg/m³',
  }),
};
