import { worksheet } from '../worksheet';
import { compute } from './compute';
import { fields } from './schema';
import { example, groups } from './view';

export const viscosityGrade = worksheet({
  name: 'viscosity-grade',
  title: 'Viscosity grade',
  summary: 'Which SAE grades an oil falls into by its viscosity at 100 °C.',
  fields,
  groups,
  example,
  compute,
});
