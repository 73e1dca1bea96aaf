import { worksheet } from '../worksheet';
import { compute } from './compute';
import { fields } from './schema';
import { example, groups } from './view';

export const injectorSet = worksheet({
  name: 'injector-set',
  title: 'Injector set',
  summary: 'Each injector before and after cleaning, the set as a set, and the power that it can feed.',
  fields,
  groups,
  example,
  compute,
});
