import { GRADES } from '../../measure/viscosityGrade';
import { choiceIfKnown, quantity } from '../fields';

export const fields = {
  viscosity: quantity('mm²/s', {
    label: 'Kinematic viscosity at 100 °C',
    hint: 'From the data sheet or the laboratory. 1 mm²/s is 1 cSt.',
    above: 0,
    most: 1000,
  }),
  grade: choiceIfKnown(
    GRADES.map(({ grade }) => ({ value: grade, label: `SAE ${grade}` })),
    {
      label: 'Grade on the can',
      hint: 'The number after the W: 30 of 5W-30.',
    },
  ),
};
