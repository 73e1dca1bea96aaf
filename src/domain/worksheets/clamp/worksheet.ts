import { worksheet } from '../worksheet';
import { compute } from './compute';
import { fields } from './schema';
import { example, groups } from './view';

export const clamp = worksheet({
  name: 'clamp',
  title: 'Clamp check',
  summary: 'Whether a torque is plausible for its fastener: the clamp load against the proof load.',
  fields,
  groups,
  example,
  compute,
});
