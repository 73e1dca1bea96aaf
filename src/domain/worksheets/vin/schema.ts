import { text } from '../fields';

export const fields = {
  vin: text({
    label: 'Vehicle identification number',
    hint: 'From the plate, not from the papers. Spaces and small letters do not matter.',
    most: 40,
  }),
};
