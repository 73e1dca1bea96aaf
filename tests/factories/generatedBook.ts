import type { SearchDocument } from '@/domain/search/documents';
import { SYSTEMS, type System } from '@/domain/procedure/schema';

/** A large book of made-up sheets for measuring: the same for the same seed, with names as various as a real book's. */

const list = (text: string): string[] => text.split(/,\s*/);

const VERBS = list(
  'Remove, Refit, Replace, Reseal, Check, Measure, Clean, Adjust, Inspect, Overhaul, Bleed, Test, Set, Align, Balance, Draw down, Drain, Fill, Mark, Lift, Lower, Turn, Press in, Press out, Tighten, Loosen, Disconnect, Connect, Support, Wash, Dry, Lay out, Compare, Record, Wipe, Blow out, Unclip, Clip in, Feed in, Slide out',
);
const PARTS = list(
  'valve cover, oil pan, timing cover, water pump, thermostat housing, intake manifold, exhaust manifold, throttle body, fuel rail, injector, cylinder head, camshaft, cam cap, bucket tappet, shim, valve spring, collet, timing chain, chain tensioner, chain guide, sprocket, crank pulley, flywheel, clutch plate, pressure plate, release bearing, spigot bearing, starter, solenoid, alternator, glow plug, spark plug, ignition coil, crankshaft, main bearing, rod bearing, piston, piston ring, gudgeon pin, connecting rod, oil pump, relief valve, oil filter, oil cooler, pickup pipe, dipstick tube, breather valve, breather baffle, bypass pipe, radiator hose, header tank, heat exchanger, raw-water pump, impeller, anode, exhaust elbow, turbocharger, wastegate, boost pipe, air cleaner, air-flow meter, knock sensor, crank sensor, cam sensor, coolant sensor, oil-pressure switch, wiring loom, earth strap, battery tray, engine mount, gearbox mount, bell housing, drive plate, ring gear, belt tensioner, idler pulley, drive belt, lift pump, injection pump, leak-off rail, fuel filter, water separator, return pipe, non-return valve, pressure damper, vacuum pump, servo pipe, rocker shaft, rocker arm, push rod, balance shaft, oil jet, core plug, drain plug, level sensor, front crank seal, rear crank seal, camshaft seal, valve stem seal, tube seal, liner, cylinder block, main cap, bearing ladder, thrust washer, dowel, locating ring',
);
const PLACES = list(
  'front, rear, upper, lower, left-hand, right-hand, inner, outer, first, second, third, fourth, inlet, exhaust, centre, drive-end, free-end, primary, secondary, main, auxiliary, port-side, starboard, hot-side, cold-side',
);
const THINGS = list(
  'bolt, nut, stud, gasket, seal, O-ring, washer, sleeve, bracket, clip, spacer, plate, cap, shaft, bush, dowel, hose, union, plug, spring, screen, bowl, shroud, heat shield, gauze, spindle, lever, link, pin, circlip',
);
const LATER = list(
  'without marking the face, in two passes, from the middle outward, while it is cold, with the battery off, before the sealant skins, one turn at a time, with the piston at top dead centre, and keep the order, square to the bore, with clean hands, after a warm run, in the frame, on the stand, by hand only, with the cover off, and write it down, until it seats, against the mark, with a second person, and watch the pointer, to the stop, under light load, with new washers, with fresh fluid, dry, oiled, and wait, through the bore, clear of the belt',
);
const TOOLS = list(
  'Torque wrench, Angle gauge, Feeler gauge, Straightedge, Dial gauge, Magnetic base, Micrometer 25 to 50 mm, Micrometer 50 to 75 mm, Bore gauge, Telescopic gauge, Depth gauge, Vernier calliper, Plastic scraper, Soft mallet, Brass drift, Seal driver, Puller, Two-leg puller, Three-leg puller, Slide hammer, Piston ring compressor, Ring expander, Valve spring compressor, Cam locking bar, Crank locking pin, Flywheel lock, Clutch centring tool, Fuel pressure gauge, Oil pressure gauge, Compression tester, Leak-down tester, Vacuum gauge, Flow bench, Ultrasonic bath, Parts washer, Drain tray, Measuring jug, Hand pump, Hose clamp pliers, Circlip pliers, Long-nose pliers, Hexagon keys, Splined bits, Ring spanners, Crowfoot spanner, Breaker bar, Speed brace, Multimeter, Current clamp, Lamp, Mirror, Engine hoist, Engine stand, Axle stands, Trolley jack, Heat gun, Thermometer, Scales, Degree wheel, Thread gauge',
);
const THREADS = [
  ['M5×0.8', 5, 7],
  ['M6×1.0', 8, 12],
  ['M8×1.25', 18, 30],
  ['M10×1.25', 35, 60],
  ['M10×1.5', 38, 65],
  ['M12×1.25', 70, 110],
  ['M14×1.5', 20, 140],
  ['1/4-20 UNC', 6, 10],
  ['5/16-18 UNC', 14, 24],
] as const;
const BOOKS = ['Common book', 'Common book', 'Common book', 'Northgate Engine Works'];

/** Chance that is the same on every machine: a linear congruential generator, Numerical Recipes' constants. */
function chance(seed: number): () => number {
  let state = seed >>> 0;
  return () => {
    state = (Math.imul(state, 1_664_525) + 1_013_904_223) >>> 0;
    return state / 4_294_967_296;
  };
}

export const GENERATED_ENGINES = Array.from({ length: 60 }, (_, i) => {
  const name = `${['Tarn', 'Brandreth', 'Eskholm', 'Wray', 'Caldew'][i % 5] ?? 'Tarn'} ${'ABDKTV'.charAt(i % 6)}${10 + i}`;
  return { key: name.toLowerCase().replace(' ', '-'), name, aliases: [name.split(' ')[1] ?? name] };
});

export function generatedDocuments(count: number, seed = 1): SearchDocument[] {
  const next = chance(seed);
  const whole = (from: number, to: number): number => from + Math.floor(next() * (to - from + 1));
  // A few names are common and most are rare, as in any trade.
  const pick = <T>(from: readonly T[]): T => from[Math.floor(next() ** 1.6 * from.length)] as T;
  const few = <T>(from: number, to: number, make: () => T): T[] => Array.from({ length: whole(from, to) }, make);
  const part = (): string => `${next() < 0.35 ? `${pick(PLACES)} ` : ''}${pick(PARTS)}`;
  const thing = (): string => `${part()} ${pick(THINGS)}`;
  const upper = (text: string): string => text.charAt(0).toUpperCase() + text.slice(1);
  const round = (value: number, step: number): number => Number((Math.round(value / step) * step).toFixed(3));
  const parts = Array.from({ length: 2500 }, () => ({
    name: upper(thing()),
    number: next() < 0.8 ? `TN-${whole(1000, 9999)}` : null,
  }));
  const systems = Object.keys(SYSTEMS) as System[];

  return Array.from({ length: count }, (_, i): SearchDocument => {
    const about = part();
    const steps = few(
      6,
      14,
      () =>
        `${pick(VERBS)} the ${next() < 0.5 ? about : next() < 0.5 ? part() : thing()}${next() < 0.4 ? ` ${pick(LATER)}` : ''}`,
    );
    const step = (): number => whole(1, steps.length);
    return {
      number: `P-${String(i + 1).padStart(4, '0')}`,
      letter: 'ABCDEF'.charAt(whole(0, 5)),
      publishedAt: new Date(Date.UTC(2026, whole(0, 10), whole(1, 28), whole(6, 17), whole(0, 59))).toISOString(),
      book: pick(BOOKS),
      title: `${pick(VERBS)} the ${about}${next() < 0.3 ? ` ${pick(THINGS)}` : ''}${next() < 0.25 ? ` ${pick(LATER)}` : ''}`,
      summary: `${pick(VERBS)} the ${part()} ${pick(LATER)}, ${pick(VERBS).toLowerCase()} the ${thing()} and ${pick(VERBS).toLowerCase()} the ${about} ${pick(LATER)}.`,
      system: pick(systems),
      engines: [...new Set(few(1, 3, () => pick(GENERATED_ENGINES).key))],
      minutes: 5 * whole(3, 90),
      skill: pick(['technician', 'apprentice', 'senior']),
      holds: whole(0, 3),
      steps,
      tools: [...new Set(few(4, 9, () => pick(TOOLS)))],
      parts: few(2, 7, () => pick(parts)),
      torques: few(1, 4, () => {
        const [thread, low, high] = pick(THREADS);
        const nm = whole(low, high);
        const passes = next() < 0.3 ? [Math.floor(nm / 2)] : [];
        return { name: upper(`${part()} bolt`), thread, nm, passes, angles: [], count: whole(1, 14), step: step() };
      }),
      limits: few(1, 4, () => {
        const min = round(next() * 0.5 + 0.02, 0.01);
        const max = round(min + 0.02 + next() * 0.2, 0.01);
        const name = upper(`${part()} clearance`);
        return { name, quantity: 'length', unit: 'mm', min, nominal: null, max, resolution: 0.01, step: step() };
      }),
      timers: few(0, 1, () => ({
        name: pick(['Soak', 'Sealant cures', 'Wait for oil to drain']),
        minutes: whole(5, 60),
        step: step(),
      })),
    };
  });
}
