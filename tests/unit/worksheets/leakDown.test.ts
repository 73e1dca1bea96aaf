import { describe, expect, it } from 'vitest';
import { answerOf, problemsOf, reasonsOf, textOf } from '../../factories/workedCase';

type Read = string | [pressure: string, heard: string];
const typed = (pressures: Read[], more: Record<string, string> = {}): Record<string, string> => ({
  supply: '550',
  ...Object.fromEntries(
    pressures.flatMap((one, i) => {
      const [pressure = '', heard = ''] = [one].flat();
      return [
        [`cylinders.${i}.pressure`, pressure],
        [`cylinders.${i}.heard`, heard],
      ];
    }),
  ),
  ...more,
});
const answer = (...given: Parameters<typeof typed>) => answerOf('leak-down', typed(...given));
const limit = { 'loss.max': '15' };

describe('leak-down', () => {
  it('takes the loss as a share of the supply, as AC 43.13-1B 8-14 does (S/Q): 80 over 60 psi is 25 %', () => {
    const [first] = answer(['60 psi'], { supply: '80 psi' }).results;
    expect(first?.value).toBeCloseTo(25, 9);
    expect(first?.text.inch).toBe('25 %');
    // On the suspicion and not a hair over it, whatever the conversion of the pressures leaves behind.
    const at = (pressure: string) => answer([pressure], { supply: '80 psi' }).verdict;
    expect([at('60.5 psi'), at('60 psi'), at('59.5 psi')]).toEqual(['none', 'none', 'look']);
  });

  it.each([
    [['510', '505', '515'], 'pass', 'The largest loss is 8 %; the most allowed is 15 %.'],
    [['510', '400', '515'], 'fail', 'Cylinder 2 loses 27 %, too much: the most allowed is 15 %.'],
    // In whole numbers 15.3 and 15 would read alike.
    [['466'], 'fail', 'Cylinder 1 loses 15.3 %, too much: the most allowed is 15.0 %.'],
    [['467.5'], 'pass', 'The largest loss is 15 %; the most allowed is 15 %.'],
  ])('judges %j by the limit: %s', (pressures, verdict, first) => {
    const made = answer(pressures, limit);
    expect(made.verdict).toBe(verdict);
    expect(reasonsOf(made)[0]).toBe(first);
  });

  it('looks again from the loss that is suspect where no limit is known', () => {
    const made = answer(['510', '400']);
    expect(made.verdict).toBe('look');
    expect(reasonsOf(made)).toEqual(['Cylinder 2 loses 27 %, more than the 25 % from which it is suspect.']);
    expect(answer(['510', '440'], { suspect: '15' }).verdict).toBe('look');
    const well = answer(['510']);
    expect(well.verdict).toBe('none');
    expect(reasonsOf(well)).toEqual(['The largest loss is 7 %; no limit was given.']);
  });

  it.each([
    [
      'exhaust',
      'look',
      'Cylinder 1: air at the exhaust points at the exhaust valve. That is never right, at any loss.',
    ],
    ['intake', 'look', 'Cylinder 1: air at the intake points at the intake valve. That is never right, at any loss.'],
    [
      'coolant',
      'look',
      'Cylinder 1: bubbles in the coolant point at head gasket, head or liner. Do not run the engine before it is found.',
    ],
    ['neighbour', 'look', 'Cylinder 1: air at the next plug hole points at the gasket between the two cylinders.'],
    ['crankcase', 'pass', 'The largest loss is 7 %; the most allowed is 15 %.'],
  ])('air heard at the %s, the loss being in limits: %s', (heard, verdict, first) => {
    const made = answer([['510', heard]], limit);
    expect(made.verdict).toBe(verdict);
    expect(reasonsOf(made)[0]).toBe(first);
  });

  it('takes the loss from a tester that shows it, without a supply', () => {
    const made = answerOf('leak-down', { 'cylinders.0.loss': '15', 'cylinders.1.loss': '16', ...limit });
    expect(reasonsOf(made)).toEqual(['Cylinder 2 loses 16 %, too much: the most allowed is 15 %.']);
    expect(made.results[0]).toMatchObject({ verdict: 'pass' });
  });

  it('judges the supply as well', () => {
    const supplied = { 'supplied.min': '540', 'supplied.max': '560' };
    expect(answer(['510'], { ...limit, ...supplied }).verdict).toBe('pass');
    expect(reasonsOf(answer(['510'], { ...limit, ...supplied, supply: '530' }))[0]).toBe(
      'The supply pressure is 530 kPa, too little: 540 to 560 kPa is allowed.',
    );
  });

  it('keeps the numbers of the cylinders where one was not tested', () => {
    const made = answer(['510', '', '400'], limit);
    expect(reasonsOf(made)).toEqual(['Cylinder 3 loses 27 %, too much: the most allowed is 15 %.']);
    expect(textOf(made, 'loss-2')).toBeUndefined();
    expect(made.results.filter(({ main }) => main).map(({ key }) => key)).toEqual(['loss-3']);
    expect(made.charts).toMatchObject([{ items: ['1', '2', '3'] }]);
    expect(made.charts[0]?.kind === 'bars' && made.charts[0].series[0]?.values[1]).toBeNull();
  });

  it('names the orifice that the published loss belongs to (Q, FAA safety tip)', () => {
    expect(textOf(answer(['510'], { bore: '82' }), 'orifice')).toEqual({ metric: '1.02 mm', inch: '0.0400 in' });
    expect(textOf(answer(['510'], { bore: '130' }), 'orifice')?.inch).toBe('0.0600 in');
  });

  it.each([
    [
      typed(['510', '', '560']),
      'cylinders.2.pressure',
      'The cylinder pressure of cylinder 3 cannot be more than the supply; the tester needs its zero set.',
    ],
    [typed([['', 'exhaust'], '510']), 'cylinders.0.pressure', 'Cylinder 1 needs its pressure or its loss.'],
    [typed(['510'], { supply: '' }), 'supply', 'A pressure on the second gauge needs the supply pressure.'],
    [typed(['510'], { 'loss.max': '-5' }), 'loss.max', 'The greatest of the loss allowed cannot be less than zero.'],
  ])('refuses %j', (given, field, message) => {
    expect(problemsOf('leak-down', given)).toEqual([{ field, message }]);
  });
});
