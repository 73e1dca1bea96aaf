import { worksheet } from '../worksheet';
import { compute } from './compute';
import { fields } from './schema';
import { example, groups } from './view';

export const units = worksheet({
  name: 'units',
  title: 'Units',
  summary: 'A measure in all the units that shops write it in.',
  fields,
  groups,
  example,
  compute,
});
