import { z } from 'zod';

/**
 * An engine that procedures are written for. The file's name is the key that `engines` in a
 * procedure's front matter points at: `content/engines/tarn-t18f.yaml` is `tarn-t18f`.
 */

const line = z.string().trim().min(1, 'must not be empty').max(120, 'must be 120 characters or fewer');
const year = z.number().int('must be a whole year').min(1900).max(2100);

export const FUELS = ['petrol', 'diesel'] as const;
export const METALS = ['cast iron', 'aluminium'] as const;

/** Swept volume in cm³ of `cylinders` bores; bore and stroke in mm. π/4 · bore² · stroke · cylinders. */
export function sweptVolume(bore: number, stroke: number, cylinders: number): number {
  return ((Math.PI / 4) * bore * bore * stroke * cylinders) / 1000;
}

export const Engine = z
  .object({
    /** As said at the bench and shown on a sheet, for example "Tarn T18F". */
    name: line,
    maker: line,
    /** First and last year it was built. */
    years: z.object({ from: year, to: year }).strict(),
    /** One sentence for lists and for search. */
    summary: line,
    cylinders: z.number().int().min(1).max(16),
    /** Displacement in litres, as the maker rounds it. */
    displacement: z.number().positive().max(30),
    /** Bore in mm. */
    bore: z.number().positive().max(300),
    /** Stroke in mm. */
    stroke: z.number().positive().max(400),
    fuel: z.enum(FUELS),
    /** How the fuel gets in, for example "port injection". */
    injection: line,
    valveGear: z
      .object({
        /** For example "two overhead camshafts, chain driven". */
        drive: line,
        valves: z.number().int().min(2).max(64),
        /** How lash is set, for example "bucket tappets with shims on top". */
        lash: line,
      })
      .strict(),
    /** Cylinders in the order they fire; cylinder 1 is at the timing drive. */
    firingOrder: z.array(z.number().int().min(1)).min(1),
    block: z.enum(METALS),
    head: z.enum(METALS),
    cooling: line,
    /** Other names people type when they look for it. */
    aliases: z.array(line).max(20).default([]),
    /** Where the numbers come from and how far to trust them. */
    values: line,
  })
  .strict()
  .superRefine((e, ctx) => {
    const bad = (path: string[], message: string) => ctx.addIssue({ code: 'custom', path, message });
    if (e.years.to < e.years.from) bad(['years', 'to'], 'must not be before the first year');
    const once = new Set(e.firingOrder);
    if (once.size !== e.cylinders || e.firingOrder.length !== e.cylinders || Math.max(...once) > e.cylinders)
      bad(['firingOrder'], `must name each cylinder from 1 to ${e.cylinders} exactly once`);
    const litres = sweptVolume(e.bore, e.stroke, e.cylinders) / 1000;
    if (Math.abs(litres - e.displacement) > 0.05)
      bad(['displacement'], `does not follow from bore, stroke and cylinders, which make ${litres.toFixed(2)} L`);
  });

export type Engine = z.infer<typeof Engine>;
