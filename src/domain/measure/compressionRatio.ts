import { GAP, OFFSET, SIZE, VOLUME } from './reach';
import { numberProblem, work, type FieldProblem, type Worked } from './worked';

export interface CylinderVolumes {
  /** m */
  bore: number;
  /** m */
  stroke: number;
  /** Combustion chamber of the head with valves and plug in, m³, by burette. */
  chamber: number;
  /** Bore of the gasket, m, and its thickness when squeezed, m. */
  gasketBore: number;
  gasketThickness: number;
  /** Piston at top dead centre below the deck, m; less than zero where it stands proud. */
  deckClearance: number;
  /** Dish of the piston, with valve pockets, m³; a dome is less than zero. */
  pistonVolume: number;
}

export interface Ratio {
  /** All in m³. */
  swept: number;
  gasket: number;
  deck: number;
  /** Chamber, gasket, deck and piston together: what is left above the piston at top dead centre. */
  clearance: number;
  /** (swept + clearance) / clearance */
  ratio: number;
  /** Deck clearance and gasket, m: what lies between a flat piston and a flat head. */
  squish: number;
}

const disc = (diameter: number) => (Math.PI / 4) * diameter ** 2;

function volumeProblems(volumes: Omit<CylinderVolumes, 'chamber'>): FieldProblem[] {
  const { bore, stroke, gasketBore, gasketThickness, deckClearance, pistonVolume } = volumes;
  return [
    ...numberProblem('bore', 'The bore', bore, SIZE),
    ...numberProblem('stroke', 'The stroke', stroke, SIZE),
    ...numberProblem('gasketBore', 'The bore of the gasket', gasketBore, SIZE),
    ...numberProblem('gasketThickness', 'The thickness of the gasket', gasketThickness, GAP),
    ...numberProblem('deckClearance', 'The deck clearance', deckClearance, OFFSET),
    ...numberProblem('pistonVolume', 'The volume of the piston crown', pistonVolume, { ...VOLUME, least: -1 }),
  ];
}

function partsOf(volumes: Omit<CylinderVolumes, 'chamber'>) {
  return {
    swept: disc(volumes.bore) * volumes.stroke,
    gasket: disc(volumes.gasketBore) * volumes.gasketThickness,
    deck: disc(volumes.bore) * volumes.deckClearance,
    piston: volumes.pistonVolume,
  };
}

/**
 * Geometric compression ratio of one cylinder: (swept + clearance) / clearance. The ring of gap above the top ring is
 * left out, as is usual: it lowers the true ratio a little. Geometry, from the definition of the ratio.
 *
 * Errors name the field; a dome that leaves no room above the piston names `pistonVolume`.
 */
export function compressionRatio(volumes: CylinderVolumes): Worked<Ratio> {
  const problems = [
    ...volumeProblems(volumes),
    ...numberProblem('chamber', 'The combustion chamber', volumes.chamber, VOLUME),
  ];
  const parts = partsOf(volumes);
  const clearance = volumes.chamber + parts.gasket + parts.deck + parts.piston;
  // An empty chamber with nothing above the piston would be an endless ratio, not a large one.
  if (problems.length === 0 && !(clearance > 1e-9 * parts.swept))
    problems.push({ field: 'pistonVolume', message: 'These volumes leave no room above the piston.' });
  return work(problems, 'bore', () => ({
    swept: parts.swept,
    gasket: parts.gasket,
    deck: parts.deck,
    clearance,
    ratio: (parts.swept + clearance) / clearance,
    squish: volumes.deckClearance + volumes.gasketThickness,
  }));
}

/**
 * The combustion chamber in m³ that gives a wanted ratio; `compressionRatio` the other way round. A ratio that would
 * need a chamber of less than nothing names `ratio`.
 */
export function chamberForRatio(ratio: number, volumes: Omit<CylinderVolumes, 'chamber'>): Worked<number> {
  const problems = [
    ...numberProblem('ratio', 'The compression ratio', ratio, { above: 1, most: 100, say: (bound) => `${bound}:1` }),
    ...volumeProblems(volumes),
  ];
  const { swept, gasket, deck, piston } = partsOf(volumes);
  const chamber = swept / (ratio - 1) - gasket - deck - piston;
  if (problems.length === 0 && chamber < 0)
    problems.push({ field: 'ratio', message: 'This ratio would need a combustion chamber of less than nothing.' });
  return work(problems, 'ratio', () => chamber);
}

export interface DeckStack {
  /** Deck of the block above the centre of the crankshaft, m. */
  blockHeight: number;
  stroke: number;
  /** Rod between the centres of its eyes, m. */
  rodLength: number;
  /** Centre of the pin to the crown of the piston, m. */
  pinHeight: number;
}

/**
 * Deck clearance by the parts, m: block height − stroke / 2 − rod − pin height. Less than zero where the piston stands
 * proud. Geometry, with the pin above the centre of the crankshaft; a measured one takes precedence.
 *
 * Errors name `blockHeight`, `stroke`, `rodLength` or `pinHeight`.
 */
export const deckClearance = ({ blockHeight, stroke, rodLength, pinHeight }: DeckStack): Worked<number> =>
  work(
    [
      ...numberProblem('blockHeight', 'The height of the block', blockHeight, SIZE),
      ...numberProblem('stroke', 'The stroke', stroke, SIZE),
      ...numberProblem('rodLength', 'The length of the rod', rodLength, SIZE),
      ...numberProblem('pinHeight', 'The height of the pin', pinHeight, SIZE),
    ],
    'blockHeight',
    () => blockHeight - stroke / 2 - rodLength - pinHeight,
  );
