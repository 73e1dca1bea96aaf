import { worksheet } from '../worksheet';
import { compute } from './compute';
import { fields } from './schema';
import { example, groups } from './view';

export const depthOverBar = worksheet({
  name: 'depth-over-bar',
  title: 'Depth over a bar',
  summary: 'The true distance from a face, read with a gauge over a bar, with the bar taken off.',
  fields,
  groups,
  example,
  compute,
});
