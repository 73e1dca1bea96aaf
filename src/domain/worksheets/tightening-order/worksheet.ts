import { worksheet } from '../worksheet';
import { compute } from './compute';
import { fields } from './schema';
import { example, groups } from './view';

export const tighteningOrder = worksheet({
  name: 'tightening-order',
  title: 'Tightening order',
  summary:
    'In which order to tighten bolts from where they stand, whether an order is a good one, and the torque of each pass.',
  fields,
  groups,
  example,
  compute,
});
