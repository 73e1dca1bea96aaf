import { worksheet } from '../worksheet';
import { compute } from './compute';
import { fields } from './schema';
import { example, groups } from './view';

export const bucketShim = worksheet({
  name: 'bucket-shim',
  title: 'Bucket shim',
  summary: 'Which valves are out of lash, and the shim from stock that brings each one back.',
  fields,
  groups,
  example,
  compute,
});
