import { worksheet } from '../worksheet';
import { compute } from './compute';
import { fields } from './schema';
import { example, groups } from './view';

export const vin = worksheet({
  name: 'vin',
  title: 'Vehicle number check',
  summary: 'Whether a vehicle identification number was copied without a slip.',
  fields,
  groups,
  example,
  compute,
});
