import { bandIfKnown, choice, quantity, quantityIfKnown } from '../fields';

const size = { above: 0, most: 2000 };
const volume = { least: 0, most: 100_000 };

export const fields = {
  bore: quantity('mm', { label: 'Bore', ...size }),
  stroke: quantity('mm', { label: 'Stroke', ...size }),
  chamber: quantity('cm³', {
    label: 'Combustion chamber',
    hint: 'By burette, valves and plug in, up to the face of the head.',
    ...volume,
  }),
  gasketBore: quantity('mm', { label: 'Bore of the gasket', ...size }),
  gasketThickness: quantity('mm', { label: 'Gasket when squeezed', least: 0, most: 50 }),
  crown: choice(
    [
      { value: 'flat', label: 'Flat' },
      { value: 'dish', label: 'Dished, or with pockets' },
      { value: 'dome', label: 'Domed' },
    ],
    { label: 'Crown of the piston' },
  ),
  crownVolume: quantityIfKnown('cm³', { label: 'Volume of dish or dome', ...volume }),
  deck: quantityIfKnown('mm', {
    label: 'Deck clearance, measured',
    hint: 'From the deck down to the crown at top dead centre; less than zero where the piston stands proud.',
    least: -50,
    most: 100,
  }),
  blockHeight: quantityIfKnown('mm', { label: 'Block, crankshaft centre to deck', ...size }),
  rodLength: quantityIfKnown('mm', { label: 'Rod, centre to centre', ...size }),
  pinHeight: quantityIfKnown('mm', { label: 'Piston, pin centre to crown', ...size }),
  ratio: bandIfKnown(':1', { label: 'Compression ratio allowed', nominal: 'wanted' }),
  wanted: quantityIfKnown(':1', {
    label: 'Ratio wanted',
    hint: 'To be told the chamber that gives it.',
    above: 1,
    most: 100,
  }),
};
