import { quantity, quantityIfKnown } from '../fields';

export const fields = {
  atBolt: quantity('N·m', { label: 'Torque at the bolt', hint: 'What the sheet asks for.', above: 0, most: 5000 }),
  length: quantity('mm', {
    label: 'Length of the wrench, L',
    hint: 'From the middle of the drive square to the middle of the grip, where your hand pulls.',
    least: 10,
    most: 3000,
  }),
  adapter: quantity('mm', {
    label: 'Length of the adapter, E',
    hint: 'From the middle of the drive square to the middle of the bolt.',
    least: 0,
    most: 3000,
  }),
  angle: quantityIfKnown('°', {
    label: 'Angle of the adapter',
    hint: 'Left empty: 0, straight on, away from the grip. 90 stands square to the wrench, 180 points back at the grip.',
    least: -360,
    most: 360,
  }),
  step: quantityIfKnown('N·m', {
    label: 'Step of the wrench',
    hint: 'What it can be set to: 1 N·m, 0.5 N·m.',
    above: 0,
    most: 100,
  }),
};
