import { worksheet } from '../worksheet';
import { compute } from './compute';
import { fields } from './schema';
import { example, groups } from './view';

export const compression = worksheet({
  name: 'compression',
  title: 'Compression',
  summary:
    'Cylinders against their limit and against each other, corrected for altitude, and what a repeat with oil says.',
  fields,
  groups,
  example,
  compute,
});
