import { flowAtPressure, powerFed } from '../../measure/injectorFlow';
import { said, show } from '../../measure/said';
import { refused, worked, type Worked } from '../../measure/worked';
import { inBoxes, measured } from '../findings';
import type { Result } from '../outcome';
import type { Inputs } from './judge';
import { FINE, flowOf } from './words';

const kPa = (pascals: number) => show(pascals, 'kPa', 1);

/** Flow at the engine's pressure, where both pressures are known, and the power that the set can feed. */
export function powerResults(inputs: Inputs, mean: number): Worked<Result[]> {
  const running = runningFlow(inputs, mean);
  if (!running.ok) return running;
  const flow = running.value ?? mean;
  const { density, duty: dutyPercent, bsfc, injectors } = inputs;
  const power = powerFed(flow, { density, count: injectors.length, dutyPercent, bsfc });
  if (!power.ok) return inBoxes(power, { dutyPercent: 'duty', count: 'injectors', flow: 'nominal' });
  const fuel = show(bsfc, 'g/kWh', 1);
  return worked([
    ...(running.value === null ? [] : [runningResult(inputs, mean, running.value)]),
    measured('power', 'Power that the set can feed', power.value, 'kW', 1, {
      formula: said`flow · density · ${injectors.length} · duty / fuel used = ${flowOf(flow)} · ${density} kg/m³ · ${injectors.length} · ${show(dutyPercent, '%')} / ${fuel} = ${show(power.value, 'kW', 1)}`,
      source: 'Power by fuel alone: quoted from a secondary page (19 lb/h, 4, 0.80, 0.50 lb/(hp·h): 121.6 hp).',
    }),
  ]);
}

function runningFlow({ benchPressure, runPressure }: Inputs, mean: number): Worked<number | null> {
  if (benchPressure === undefined && runPressure === undefined) return worked(null);
  if (benchPressure === undefined || runPressure === undefined)
    return refused({
      field: benchPressure === undefined ? 'benchPressure' : 'runPressure',
      message: 'Flow at another pressure needs the pressure on the bench and in the engine.',
    });
  const flow = flowAtPressure({ flow: mean, from: benchPressure, to: runPressure });
  return flow.ok ? flow : inBoxes(flow, { from: 'benchPressure', to: 'runPressure', flow: 'nominal' });
}

const runningResult = ({ benchPressure = 0, runPressure = 0 }: Inputs, mean: number, flow: number): Result =>
  measured('flow-in-engine', 'Mean flow at the pressure of the engine', flow, 'cc/min', FINE, {
    formula: said`mean · √(engine / bench) = ${flowOf(mean)} · √(${kPa(runPressure)} / ${kPa(benchPressure)}) = ${flowOf(flow)}`,
    source: 'Square-root law: quoted from a secondary page (pressure up by half, flow up by 22.5 %).',
  });
