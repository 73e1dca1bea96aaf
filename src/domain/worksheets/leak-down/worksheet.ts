import { worksheet } from '../worksheet';
import { compute } from './compute';
import { fields } from './schema';
import { example, groups } from './view';

export const leakDown = worksheet({
  name: 'leak-down',
  title: 'Leak-down',
  summary: 'How much of the air each cylinder loses, and what the place where it is heard points at.',
  fields,
  groups,
  example,
  compute,
});
