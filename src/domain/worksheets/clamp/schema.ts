import { choice, quantity, quantityIfKnown, text, textIfKnown } from '../fields';

export const fields = {
  thread: text({ label: 'Thread', hint: 'M8, 3/8-16 UNC, #10-32 UNF.', most: 30 }),
  pitch: quantityIfKnown('mm', {
    label: 'Pitch of a metric thread',
    hint: 'Left empty: the coarse pitch.',
    above: 0,
    most: 6,
  }),
  propertyClass: textIfKnown({
    label: 'Class on the head',
    hint: '8.8 or 10.9 for metric bolts, SAE 5 or SAE 8 for inch bolts.',
    most: 20,
  }),
  torque: quantity('N·m', { label: 'Torque', hint: 'Before any angle.', above: 0, most: 5000 }),
  condition: choice(
    [
      { value: 'dry', label: 'Dry' },
      { value: 'oiled', label: 'Oiled' },
      { value: 'threadlocker', label: 'With threadlocker' },
      { value: 'sealant', label: 'With sealant' },
      { value: 'anti-seize', label: 'With anti-seize' },
    ],
    { label: 'Thread and head' },
  ),
  angle: quantityIfKnown('°', { label: 'Angle after the torque', above: 0, most: 1440 }),
  before: quantityIfKnown('N·m', {
    label: 'Torque before a change',
    hint: 'To see whether the change looks like another unit.',
    above: 0,
    most: 5000,
  }),
  low: quantity('%', {
    label: 'Low below this share of proof',
    hint: 'Common practice, no source; covers on soft gaskets clamp at about a third.',
    least: 0,
    most: 100,
    usual: 30,
  }),
};
