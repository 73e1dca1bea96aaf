import { worksheet } from '../worksheet';
import { compute } from './compute';
import { fields } from './schema';
import { example, groups } from './view';

export const wrenchAdapter = worksheet({
  name: 'wrench-adapter',
  title: 'Wrench with an adapter',
  summary: 'What to set a torque wrench to when a crow-foot stands between it and the bolt.',
  fields,
  groups,
  example,
  compute,
});
