import { band, quantityIfKnown } from '../fields';

export const fields = {
  tolerance: band('mm', { label: 'Limit', hint: 'Least and most: 20 ± 0.05 mm is 19.95 to 20.05.' }),
  resolution: quantityIfKnown('mm', {
    label: 'Smallest step the tool shows',
    hint: 'As it stands on the tool: 0.01 mm, 0.001 in.',
    above: 0,
    most: 100,
  }),
  uncertainty: quantityIfKnown('mm', {
    label: 'Uncertainty of the tool',
    hint: 'From its certificate. The larger of the two counts.',
    above: 0,
    most: 100,
  }),
};
