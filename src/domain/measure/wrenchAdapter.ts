import { type FieldProblem, type Worked, numberProblem, work } from './worked';

/** A torque wrench with an adapter on its square. Lengths in m, both in the plane of the pull. */
export interface Adapter {
  /** L: from the middle of the drive square to the middle of the grip. */
  length: number;
  /** E: from the middle of the drive square to the middle of the bolt. */
  adapter: number;
  /** Between wrench and adapter in degrees: 0 lengthens the wrench, 90 stands square to it, 180 points back to the hand. */
  angle: number;
}

/** Cosine of an angle in degrees, with nothing left over at a right angle. */
function cosine(degrees: number): number {
  const turned = ((degrees % 360) + 360) % 360;
  if (turned === 90 || turned === 270) return 0;
  if (turned === 180) return -1;
  return Math.cos((turned * Math.PI) / 180);
}

/** L + E·cos θ: how long the wrench is with the adapter on it, seen along the wrench. */
const effective = ({ length, adapter, angle }: Adapter) => length + adapter * cosine(angle);

/** No hand pulls a longer wrench; beyond it somebody has typed millimetres for metres. */
const REACH = { most: 10, say: (bound: number) => `${bound} m` };

function problemsOf(torque: FieldProblem[], wrench: Adapter): FieldProblem[] {
  const problems = [
    ...torque,
    ...numberProblem('length', 'The length of the wrench', wrench.length, { above: 0, ...REACH }),
    ...numberProblem('adapter', 'The length of the adapter', wrench.adapter, { least: 0, ...REACH }),
    ...numberProblem('angle', 'The angle', wrench.angle, { least: -360, most: 360, say: (bound) => `${bound}°` }),
  ];
  if (problems.length > 0 || effective(wrench) > 0) return problems;
  return [
    {
      field: 'adapter',
      message: 'The adapter points back as far as the grip or beyond it; the wrench cannot turn the bolt.',
    },
  ];
}

/**
 * What to set the wrench to so that the bolt gets its torque: T_w = T_a·L/(L + E·cos θ).
 *
 * @param atBolt torque wanted at the bolt, in N·m
 * @returns the setting in N·m; problems name `atBolt`, `length`, `adapter` or `angle`
 *
 * Source: TM 1-1500-204-23-9, 8-5 (straight, back and at a right angle); TM 9-254, figure 4-6 (cos θ); FAA AC 43.13-1B,
 * 7-40h. Holds where the hand pulls at the middle of the grip.
 */
export function wrenchSetting(atBolt: number, wrench: Adapter): Worked<number> {
  return work(
    problemsOf(numberProblem('atBolt', 'The torque at the bolt', atBolt, { above: 0 }), wrench),
    'atBolt',
    () => atBolt * (wrench.length / effective(wrench)),
  );
}

/**
 * What the bolt gets at a setting of the wrench, T_a = T_w·(L + E·cos θ)/L; the other way round of `wrenchSetting`.
 *
 * @param setting of the wrench, in N·m
 * @returns torque at the bolt in N·m; problems name `setting`, `length`, `adapter` or `angle`
 */
export function torqueAtBolt(setting: number, wrench: Adapter): Worked<number> {
  return work(
    problemsOf(numberProblem('setting', 'The setting of the wrench', setting, { above: 0 }), wrench),
    'setting',
    () => setting * (effective(wrench) / wrench.length),
  );
}
