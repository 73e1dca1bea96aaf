import { worksheet } from '../worksheet';
import { compute } from './compute';
import { fields } from './schema';
import { example, groups } from './view';

export const bearingClearance = worksheet({
  name: 'bearing-clearance',
  title: 'Bearing clearance',
  summary: 'Oil clearance of each bearing from bore and journal, or from housing, shells and journal, and end play.',
  fields,
  groups,
  example,
  compute,
});
