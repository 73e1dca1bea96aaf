import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  HEARD,
  judgeLeakDown,
  lossPercent,
  pressureAtLoss,
  testerOrifice,
  type Heard,
  type LeakReading,
} from '@/domain/measure/leakDown';
import { sweep } from '../../factories/hostileNumbers';
import { between, INCH, valueOf } from '../../factories/measures';

const kPa = (supply: number, cylinder: number, ...heard: Heard[]): LeakReading => ({
  supply: supply * 1000,
  cylinder: cylinder * 1000,
  ...(heard.length > 0 ? { heard } : {}),
});

describe('leak-down', () => {
  it('judges each cylinder and says what the sound points at', () => {
    const found = valueOf(
      judgeLeakDown([kPa(550, 500, 'crankcase'), kPa(550, 467.5), kPa(550, 400, 'exhaust', 'coolant')], { max: 15 }),
    );
    expect(found.cylinders.map((one) => one?.judged?.at)).toEqual(['in', 'in', 'over']);
    expect(found.cylinders[2]?.pointsAt).toEqual(['exhaust valve', 'head gasket, head or liner']);
    expect(found.worst).toBeCloseTo(27.273, 3);
    expect(found.passes).toBe(false);
  });

  it('passes over a cylinder that was not tested, and keeps the numbers of the others', () => {
    const found = valueOf(judgeLeakDown([kPa(550, 500), null, kPa(550, 400)], { max: 15 }));
    expect(found.cylinders.map((one) => one?.judged?.at ?? null)).toEqual(['in', null, 'over']);
    expect(judgeLeakDown([kPa(550, 500), null, kPa(550, 560)])).toMatchObject({
      problems: [{ field: 'readings.2.cylinder' }],
    });
    expect(judgeLeakDown([null, null])).toEqual({
      ok: false,
      problems: [{ field: 'readings', message: 'The leak-down test must hold one cylinder that was tested.' }],
    });
  });

  it('knows a place for each sound', () => {
    const all = Object.keys(HEARD) as Heard[];
    expect(valueOf(judgeLeakDown([kPa(550, 500, ...all)])).cylinders[0]?.pointsAt).toHaveLength(5);
  });

  it('there and back again is where it started', () => {
    fc.assert(
      fc.property(between(1e4, 1e6), between(0, 100), (supply, loss) => {
        const back = valueOf(lossPercent(supply, valueOf(pressureAtLoss(supply, loss))));
        expect(Math.abs(back - loss)).toBeLessThan(1e-12 * 100);
      }),
    );
  });

  it('never passes a lower cylinder pressure where a higher one fails', () => {
    fc.assert(
      fc.property(between(0, 550), between(0, 1), (cylinder, share) => {
        const passes = (pressure: number) => valueOf(judgeLeakDown([kPa(550, pressure)], { max: 15 })).passes;
        if (!passes(cylinder)) expect(passes(cylinder * share)).toBe(false);
      }),
    );
  });

  it('takes a tight cylinder as no loss, and refuses gauges that do not agree', () => {
    expect(valueOf(lossPercent(551_580.6, 551_580.6 * (1 + 1e-13)))).toBe(0);
    expect(lossPercent(550_000, 560_000)).toEqual({
      ok: false,
      problems: [
        {
          field: 'cylinder',
          message: 'The cylinder pressure cannot be more than the supply; the tester needs its zero set.',
        },
      ],
    });
    expect(judgeLeakDown([kPa(550, 500), kPa(550, 560)])).toMatchObject({
      problems: [{ field: 'readings.1.cylinder' }],
    });
    expect(judgeLeakDown([kPa(550, 500, 'ceiling' as Heard)])).toMatchObject({
      problems: [
        { field: 'readings.0.heard', message: 'Where air is heard of cylinder 1 must be chosen from the list.' },
      ],
    });
    expect(judgeLeakDown([undefined as unknown as LeakReading]).ok).toBe(false);
  });

  it('withstands odd input', () => {
    const good = { readings: [kPa(550, 500), kPa(550, 520)], band: { max: 15 } };
    sweep((input: typeof good) => judgeLeakDown(input.readings, input.band), good);
    sweep(({ supply, cylinder }: LeakReading) => lossPercent(supply, cylinder), kPa(550, 500));
    const loss = { supply: 550_000, loss: 12 };
    sweep((input: typeof loss) => pressureAtLoss(input.supply, input.loss), loss);
    sweep(({ bore }: { bore: number }) => testerOrifice(bore), { bore: 4 * INCH });
  });
});
