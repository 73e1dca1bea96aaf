import type { Attributes } from '../procedure/components';

/** A component as it is written, for attributes that hold keys only: `<Torque of="cover-bolt" pass="1" />`. */
export const componentText = (name: string, given: Attributes): string =>
  `<${name}${Object.entries(given)
    .map(([attribute, value]) => ` ${attribute}="${value}"`)
    .join('')} />`;
