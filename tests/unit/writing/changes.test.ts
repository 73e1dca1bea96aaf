import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { changeWords, draftChanges, inOne } from '@/domain/writing/changes';
import type { Draft } from '@/domain/writing/draft';
import { readDraft } from '@/domain/writing/readDraft';
import { textChanges } from '@/domain/writing/textChanges';

const source = readFileSync('content/procedures/p-0142-valve-cover-reseal.mdx', 'utf8');
const draft = () => readDraft(source)!;
function changed(act: (draft: Draft) => void): ReturnType<typeof draftChanges> {
  const to = draft();
  act(to);
  return draftChanges(draft(), to);
}
const words = (act: (draft: Draft) => void) => changeWords(changed(act));

describe('what changed in a draft, in words', () => {
  it('says nothing where nothing did', () => {
    expect(draftChanges(draft(), draft())).toEqual([]);
    expect(textChanges({ source, reason: '' }, { source, reason: '' })).toEqual([]);
  });

  it('names steps by their numbers', () => {
    expect(words((d) => void d.steps.splice(2, 1))).toEqual(['step 3 deleted']);
    expect(words((d) => void d.steps.splice(2, 0, { id: 'x', title: '', cautions: [], body: '' }))).toEqual([
      'step 3 added',
    ]);
    expect(words((d) => void (d.steps[3]!.body += ' And again.'))).toEqual(['step 4 changed']);
    expect(words((d) => void (d.steps[3]!.cautions = ['other']))).toEqual(['cautions before step 4 changed']);
    expect(words((d) => d.steps.splice(4, 0, ...d.steps.splice(1, 1)))).toEqual(['step 2 moved to 5']);
    expect(words((d) => d.steps.splice(1, 0, ...d.steps.splice(4, 1)))).toEqual(['step 5 moved to 2']);
    expect(words((d) => void d.steps.reverse())).toEqual(['steps put in another order']);
  });

  it('follows a step that got its id from its first title', () => {
    const from = draft();
    from.steps.push({ id: 'new-step', title: '', cautions: [], body: '' });
    const to = structuredClone(from);
    Object.assign(to.steps.at(-1)!, { id: 'wipe-it', title: 'Wipe it' });
    const n = to.steps.length;
    expect(draftChanges(from, to)).toEqual([
      { path: 'steps.wipe-it.title', kind: 'typed', words: `step ${n} changed` },
      { path: 'steps.wipe-it.id', kind: 'named', words: `step ${n} changed` },
    ]);
  });

  it('names values by what they are called', () => {
    const [torque] = draft().torques;
    const name = torque!['name']!;
    expect(words((d) => void (d.torques[0]!['nm'] = '11'))).toEqual([`torque ${name} changed`]);
    expect(words((d) => void d.torques.splice(0, 1))).toEqual([`torque ${name} deleted`]);
    expect(words((d) => void d.parts.push({ key: 'clip', name: 'Clip' }))).toEqual(['part Clip added']);
    expect(words((d) => void d.figures.push({ key: 'top', caption: 'From above' }))).toEqual([
      'drawing From above added',
    ]);
    expect(words((d) => void d.parts.reverse())).toEqual(['parts put in another order']);
    expect(words((d) => void (d.parts[0]!['name'] = 'x'.repeat(80)))[0]).toMatch(/^part x{47}… changed$/);
  });

  it('names the head of the sheet', () => {
    expect(
      words((d) => void Object.assign(d, { title: 'x', minutes: '9', critical: !d.critical, intro: 'x', reason: 'x' })),
    ).toEqual([
      'title changed',
      'bench time changed',
      draft().critical ? 'no longer marked critical' : 'marked critical',
      'introduction changed',
      'reason changed',
    ]);
    expect(words((d) => void (d.engines = []))).toEqual(['engines changed']);
  });

  it('says each thing once, and several in one', () => {
    const changes = changed((d) => {
      Object.assign(d.steps[0]!, { title: 'x', body: 'y' });
      d.minutes = '9';
      d.reason = 'x';
    });
    expect(changes).toHaveLength(4);
    expect(inOne(changes)).toBe('bench time changed and 2 more');
    expect([inOne(changes.slice(0, 1)), inOne([])]).toEqual(['bench time changed', '']);
  });

  it('counts lines where the form cannot show a text, and copes with keys that stand twice', () => {
    expect(textChanges({ source: 'a\nb\nc', reason: '' }, { source: 'a\nx\nc\nd', reason: 'y' })).toEqual([
      '2 lines of the text',
      'reason changed',
    ]);
    expect(textChanges({ source, reason: '' }, { source: source.replace('title: ', 'titel: '), reason: '' })).toEqual([
      '1 line of the text',
    ]);
    const twice = draft();
    twice.parts.push({ ...twice.parts[0]! });
    expect(changeWords(draftChanges(draft(), twice))).toEqual([`part ${twice.parts[0]!['name']} added`]);
  });
});
