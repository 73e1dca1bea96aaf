import { placeInIfAny, optionalBandProblems } from '../../measure/band';
import { chamberForRatio, compressionRatio, deckClearance, type CylinderVolumes } from '../../measure/compressionRatio';
import { said, show } from '../../measure/said';
import { refused, worked, type Worked } from '../../measure/worked';
import type { Values } from '../fields';
import { inBoxes, judgedFinding, lookAgain, measured, noted, outcomeOf, verdictOf, type Finding } from '../findings';
import type { Outcome, Result } from '../outcome';
import type { fields } from './schema';

type Inputs = Values<typeof fields>;

const cc = (volume: number) => show(volume, 'cm³', 0.1);
const mm = (metres: number) => show(metres, 'mm', 0.01);
const BOXES = { deckClearance: 'deck', pistonVolume: 'crownVolume' };
const ratioText = (ratio: number) => show(ratio, ':1').metric;
const GEOMETRY = 'Geometry; the gap above the top ring is left out, as is usual.';

/** Dish more, dome less, m³. */
function crownOf({ crown, crownVolume }: Inputs): Worked<number> {
  if (crown === 'flat') return worked(0);
  if (crownVolume === undefined) return refused({ field: 'crownVolume', message: `Say how large the ${crown} is.` });
  return worked(crown === 'dome' ? -crownVolume : crownVolume);
}

function partsDeck({ blockHeight, stroke, rodLength, pinHeight }: Inputs): Worked<number | null> {
  if (blockHeight === undefined || rodLength === undefined || pinHeight === undefined) return worked(null);
  return deckClearance({ blockHeight, stroke, rodLength, pinHeight });
}

/** Compression ratio; see `measure/compressionRatio.ts`. A measured deck clearance goes before one by the parts. */
export function compute(inputs: Inputs): Worked<Outcome> {
  const pistonVolume = crownOf(inputs);
  if (!pistonVolume.ok) return pistonVolume;
  const byParts = partsDeck(inputs);
  if (!byParts.ok) return byParts;
  const deck = inputs.deck ?? byParts.value;
  if (deck === null)
    return refused({
      field: 'deck',
      message: 'Give the deck clearance, or block, rod and piston heights to work it out from.',
    });
  const { bore, stroke, chamber, gasketBore, gasketThickness, ratio: band } = inputs;
  const volumes = {
    bore,
    stroke,
    chamber,
    gasketBore,
    gasketThickness,
    deckClearance: deck,
    pistonVolume: pistonVolume.value,
  };
  const found = compressionRatio(volumes);
  if (!found.ok) return inBoxes(found, BOXES);
  const problems = optionalBandProblems('ratio', 'The ratio allowed', band, { above: 0, most: 1000 });
  if (problems.length > 0) return refused(...problems);

  const { swept, clearance, ratio, squish } = found.value;
  const judged = placeInIfAny(ratio, band);
  const shown = show(ratio, ':1', 0.01);
  const results: Result[] = [
    measured('ratio', 'Compression ratio', ratio, ':1', 0.01, {
      verdict: verdictOf(judged),
      formula: said`(swept + clearance) / clearance = (${cc(swept)} + ${cc(clearance)}) / ${cc(clearance)} = ${shown}`,
      source: GEOMETRY,
      main: true,
    }),
    measured('swept', 'Swept volume of one cylinder', swept, 'cm³', 0.1, {
      formula: said`π/4 · bore² · stroke = π/4 · (${mm(bore)})² · ${mm(stroke)} = ${cc(swept)}`,
    }),
    measured('clearance', 'Volume left above the piston', clearance, 'cm³', 0.1, {
      formula: said`chamber + gasket + deck + crown = ${cc(chamber)} + ${cc(found.value.gasket)} + (${cc(found.value.deck)}) + (${cc(pistonVolume.value)}) = ${cc(clearance)}`,
    }),
    measured('squish', 'Between a flat crown and a flat head', squish, 'mm', 0.01),
    ...(byParts.value === null
      ? []
      : [
          measured('deck-by-parts', 'Deck clearance by the parts', byParts.value, 'mm', 0.01, {
            formula: said`block − stroke / 2 − rod − pin height = ${mm(byParts.value)}`,
          }),
        ]),
  ];
  const wanted = chamberWanted(inputs, volumes);
  if (!wanted.ok) return wanted;
  const judgement = judgedFinding({
    subject: 'The compression ratio is',
    value: ratio,
    judged,
    band,
    unit: ':1',
    fineness: 0.01,
  });
  const findings = [
    ...(judgement.length > 0 ? judgement : [noted(said`The compression ratio is ${shown}.`)]),
    ...touching(squish),
    ...(wanted.value ? [wantedFinding(inputs, wanted.value)] : []),
  ];
  return outcomeOf(findings, [...results, ...(wanted.value ? [wanted.value.result] : [])]);
}

/** How near the parts may come is the builder's to say; less than nothing is not. */
const touching = (squish: number): Finding[] =>
  squish > 0
    ? []
    : [lookAgain(said`A flat crown would stand ${mm(-squish)} above the face of the gasket and meet a flat head.`)];

interface Wanted {
  /** m³ */
  chamber: number;
  result: Result;
}

function chamberWanted({ wanted }: Inputs, volumes: CylinderVolumes): Worked<Wanted | null> {
  if (wanted === undefined) return worked(null);
  const found = chamberForRatio(wanted, volumes);
  if (!found.ok) return inBoxes(found, { ...BOXES, ratio: 'wanted' });
  const label = `Chamber for ${ratioText(wanted)}, all else the same`;
  return worked({
    chamber: found.value,
    result: measured('chamber-wanted', label, found.value, 'cm³', 0.1, { source: GEOMETRY }),
  });
}

function wantedFinding({ chamber, wanted = 0 }: Inputs, { chamber: other }: Wanted): Finding {
  const change = other - chamber;
  const opening = `For ${ratioText(wanted)} the chamber must hold`;
  const size = cc(Math.abs(change));
  // Less than a burette shows is no change to make.
  if (Math.abs(change) < 0.05e-6) return noted(said`${opening} ${cc(other)}, as it does.`);
  return noted(said`${opening} ${cc(other)}: ${size} ${change < 0 ? 'less' : 'more'} than it does.`);
}
