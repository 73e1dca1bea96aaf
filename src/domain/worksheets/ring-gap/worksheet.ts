import { worksheet } from '../worksheet';
import { compute } from './compute';
import { fields } from './schema';
import { example, groups } from './view';

export const ringGap = worksheet({
  name: 'ring-gap',
  title: 'Ring end gap',
  summary: 'Which rings pass, how much to file off one that is tight, and what a gap becomes in another bore.',
  fields,
  groups,
  example,
  compute,
});
