import { worksheet } from '../worksheet';
import { compute } from './compute';
import { fields } from './schema';
import { example, groups } from './view';

export const flatness = worksheet({
  name: 'flatness',
  title: 'Flatness',
  summary: 'Whether a face is flat enough, by straightedge and feeler gauge or by heights on a plate.',
  fields,
  groups,
  example,
  compute,
});
