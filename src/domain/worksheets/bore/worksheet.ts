import { worksheet } from '../worksheet';
import { compute } from './compute';
import { fields } from './schema';
import { example, groups } from './view';

export const bore = worksheet({
  name: 'bore',
  title: 'Bore',
  summary: 'Taper, out-of-round, wear and piston clearance of one cylinder, from two or three heights on two axes.',
  fields,
  groups,
  example,
  compute,
});
