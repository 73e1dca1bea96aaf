import { describe, expect, it } from 'vitest';
import { changeWords } from '@/domain/revision/changeWords';
import { parsedSample } from './changeSample';

const told = (change: Parameters<typeof parsedSample>[0]) =>
  changeWords(parsedSample(), parsedSample(change)).lines.map(({ what }) => what);

describe('what a revision changed, in words', () => {
  it('tells a value once, and not again for the step that points at it', () => {
    expect(told((p) => void Object.assign(p.frontmatter.torques[0]!, { nm: 12 }))).toEqual([
      'Cover bolt torque, 10 to 12 N·m',
    ]);
  });
  it('tells a step that was reworded, added, removed or moved', () => {
    expect(told((p) => void (p.steps[0]!.body = 'Wipe it twice.'))).toEqual(['Step “Wipe the joint”, reworded']);
    expect(
      told((p) => void p.steps.push({ id: 'look', title: 'Look once more', cautions: [], body: 'Look.' })),
    ).toEqual(['Step “Look once more”, added']);
    expect(told((p) => void p.steps.shift())).toEqual(['Step “Wipe the joint”, removed']);
    const [moved] = told((p) => void p.steps.reverse());
    expect(moved).toMatch(/^Step “(Wipe the joint|Tighten the cover)”, moved from place [12] to [12]$/);
  });
  it('tells new words of the introduction, and nothing of the same text', () => {
    expect(told((p) => void (p.intro = 'Read it first.'))).toEqual(['The introduction, reworded']);
    expect(told(() => undefined)).toEqual([]);
  });
  it('names what is grave', () => {
    expect(
      changeWords(
        parsedSample(),
        parsedSample((p) => void Object.assign(p.frontmatter.torques[0]!, { nm: 40 })),
      ).grave,
    ).toMatch(/past its proof load/);
  });
});
