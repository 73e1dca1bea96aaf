import { worksheet } from '../worksheet';
import { compute } from './compute';
import { fields } from './schema';
import { example, groups } from './view';

export const gaugeFit = worksheet({
  name: 'gauge-fit',
  title: 'Gauge fit',
  summary: 'Whether the measuring tool is fine enough for this limit, and which one would be.',
  fields,
  groups,
  example,
  compute,
});
