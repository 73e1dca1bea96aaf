import { describe, expect, it } from 'vitest';
import { ENTRY_FIELDS, HEAD_FIELDS } from '@/domain/procedure/fields';
import { parseProcedure } from '@/domain/procedure/parse';
import * as schema from '@/domain/procedure/schema';
import { changed, placeIn, SAMPLE } from './sample';

/** [change from, to, where it must point, sentence, place in the form] */
const FAULTS: [string, string, string, string, string][] = [
  ['nm: 10', 'nm: ten', 'ten', 'Torque 1 (Cover bolt): torque in N·m must be a number; "ten" is text.', 'torques.0.nm'],
  ['nm: 10', 'nm: 10 N·m', '10 N·m', 'Torque 1 (Cover bolt): torque in N·m must be a number alone, without its unit; "10 N·m" is text.', 'torques.0.nm'],
  ['nm: 10', 'nm: 0', '0\n    tolerance', 'Torque 1 (Cover bolt): torque in N·m must be more than zero.', 'torques.0.nm'],
  ['tolerance: 1', 'tolerance: 10', '10\n    passes', 'Torque 1 (Cover bolt): tolerance must be smaller than the torque itself.', 'torques.0.tolerance'],
  ['tolerance: 1', 'tolerance:', 'tolerance:', 'Torque 1 (Cover bolt): tolerance is empty: fill it in or remove the line.', 'torques.0.tolerance'],
  ['tolerance: 1', 'tolerence: 1', 'tolerence', 'Torque 1 (Cover bolt): there is no field "tolerence". Did you mean "tolerance"?', 'torques.0.tolerence'],
  ['class: "8.8"', 'class: 8.8', '8.8', 'Torque 1 (Cover bolt): property class must be text: put it in quotes, "8.8".', 'torques.0.class'],
  ['    pitch: 1\n', '', 'key: cover-bolt\n    name: Cover bolt\n    thread', 'Torque 1 (Cover bolt): pitch is missing: a metric thread needs its pitch in mm.', 'torques.0.pitch'],
  ['passes: [5]', 'passes: [5, 4]', '4]', 'Torque 1 (Cover bolt): passes, number 2, must rise from pass to pass and stay below the final torque.', 'torques.0.passes.1'],
  ['order: [1, 3, 2, 4]', 'order: [1, 3, 2, 3]', '[1, 3, 2, 3]', 'Torque 1 (Cover bolt): order must name each bolt from 1 to 4 exactly once.', 'torques.0.order'],
  ['unit: mm', 'unit: bar', 'bar', 'Limit 1 (Gap at the corner): unit "bar" is no unit of length; use mm, µm, in, thou.', 'limits.0.unit'],
  ['signal: WARNING', 'signal: BEWARE', 'BEWARE', 'Caution 1 (Hot oil and hot metal): signal word must be one of DANGER, WARNING, CAUTION, NOTICE.', 'cautions.0.signal'],
  ['minutes: 70', 'minutes: 1.5', '1.5', 'Bench time must be a whole number.', 'minutes'],
  ['skill: apprentice\n', '', 'title', 'Skill is missing.', 'skill'],
  ['minutes: 70', 'minutes: 70\nminuts: 4', 'minuts', 'There is no field "minuts". Did you mean "minutes"?', 'minuts'],
  ['key: weep', 'key: gap', 'gap\n    name: Weep', 'Limit 2 (Weep after warm-up): key "gap" is used twice in limits; give each entry its own key.', 'limits.1.key'],
  ['source: demo', 'source: book', 'book', 'Torque 1 (Cover bolt): source points at source "book", which is not in sources.', 'torques.0.source'],
  ['file: cover-underside.svg', 'file: ../x.svg', '../x.svg', 'Figure 1 (Underside of the cover): file must be the name of a drawing, for example cover-underside.svg.', 'figures.0.file'],
]; // prettier-ignore

describe('a fault in the front matter', () => {
  it.each(FAULTS)('%s → %s', (from, to, at, message, path) => {
    const source = changed(from, to);
    const parsed = parseProcedure(source);
    const errors = parsed.ok ? [] : parsed.errors;
    expect(errors.find((e) => e.path === path)).toEqual({ ...placeIn(source, at), message, path });
  });

  it('in its YAML is told at its place', () => {
    const parsed = parseProcedure(changed('name: Cover bolt\n', 'name: Cover: bolt\n'));
    expect(parsed.ok ? [] : parsed.errors[0]).toMatchObject({
      ...placeIn(SAMPLE, 'Cover bolt\n'),
      message: 'This value has a colon in it that reads as a field. Put the whole value in double quotes.',
    });
  });
});

describe('the register of fields', () => {
  it('names the fields of the schema in the order of the schema', () => {
    expect(Object.keys(HEAD_FIELDS)).toEqual(Object.keys(schema.FrontmatterFields.shape));
    const shapes = {
      parts: schema.Part.shape,
      tools: schema.Tool.shape,
      supplies: schema.Supply.shape,
      torques: schema.Torque.innerType().shape,
      limits: schema.Limit.innerType().shape,
      cautions: schema.Caution.shape,
      timers: schema.Timer.shape,
      figures: schema.Figure.shape,
      sources: schema.Source.shape,
    };
    for (const [list, shape] of Object.entries(shapes))
      expect(Object.keys(ENTRY_FIELDS[list as keyof typeof ENTRY_FIELDS]), list).toEqual(Object.keys(shape));
    expect(Object.keys(ENTRY_FIELDS)).toEqual([...schema.KEYED_LISTS]);
  });

  it('lets the sample through', () => {
    expect(parseProcedure(SAMPLE).ok).toBe(true);
  });
});
