import { worksheet } from '../worksheet';
import { compute } from './compute';
import { fields } from './schema';
import { example, groups } from './view';

export const compressionRatio = worksheet({
  name: 'compression-ratio',
  title: 'Compression ratio',
  summary: 'Swept volume, what is left above the piston, the ratio of the two, and the deck clearance.',
  fields,
  groups,
  example,
  compute,
});
