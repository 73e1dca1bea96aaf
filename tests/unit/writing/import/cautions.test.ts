import { describe, expect, it } from 'vitest';
import { importMarkdown } from '@/domain/writing/import/importHowTo';
import { saidCaution } from '@/domain/writing/import/cautionWords';

const read = (markdown: string) => {
  const read = importMarkdown(markdown);
  if (!read.ok) throw new Error(read.message);
  return read.imported;
};
const brief = (markdown: string) =>
  read(markdown).cautions.map(({ signal, hazard, harm, avoid, steps }) => [signal, hazard, harm, avoid, steps.join()]);

const HAZARD = 'Fill in: what can hurt.';
const HARM = 'Fill in: what it does, and to whom.';
const AVOID = 'Fill in: how to avoid it.';

describe('the words of a caution', () => {
  it.each([
    ['Hot oil can burn skin. Let it cool.', 'Hot oil', 'can burn skin', 'Let it cool.'],
    ['The spring may fly out.', 'The spring', 'may fly out', AVOID],
    ['Moving belts.', 'Moving belts', HARM, AVOID],
    ['Do not pry here. The face scratches.', HAZARD, HARM, 'Do not pry here. The face scratches.'],
    ['Wear goggles.', HAZARD, HARM, 'Wear goggles.'],
  ])('%s', (words, hazard, harm, avoid) => {
    expect(saidCaution('WARNING', words)).toEqual({ signal: 'WARNING', hazard, harm, avoid, rest: '' });
  });

  it('keeps what is too long for a field: whole where nothing fits, the last sentences where some do', () => {
    const long = `${'word '.repeat(60)}end.`;
    expect(saidCaution('DANGER', long)).toMatchObject({ hazard: HAZARD, harm: HARM, avoid: AVOID, rest: long });
    const many = `Hot oil can burn. ${'Stand well back from it. '.repeat(14)}`.trim();
    const { avoid, rest } = saidCaution('DANGER', many);
    expect(avoid.length).toBeLessThanOrEqual(240);
    expect(`Hot oil can burn. ${avoid} ${rest}`).toBe(many);
  });
});

describe('cautions in a how-to', () => {
  it('stand before the step that they stand before', () => {
    expect(brief('# T\n\n1. First\n\nWARNING: Hot oil can burn. Wait.\n\n2. Second\n')).toEqual([
      ['WARNING', 'Hot oil', 'can burn', 'Wait.', '2'],
    ]);
    expect(brief('# T\n\nDanger: Gas can kill. Open the door.\n\n1. First\n2. Second\n')).toEqual([
      ['DANGER', 'Gas', 'can kill', 'Open the door.', '1'],
    ]);
  });

  it('come forward where they stand behind the words of their step; at its end they stand before both', () => {
    expect(
      brief('# T\n\n## One\n\nPull it.\n\nCaution: The lid can snap. Hold it.\n\nTurn it.\n\n## Two\n\nGo.'),
    ).toEqual([['CAUTION', 'The lid', 'can snap', 'Hold it.', '1']]);
    expect(brief('# T\n\n## One\n\nPull it.\n\nCaution: The lid can snap. Hold it.\n\n## Two\n\nGo.')).toEqual([
      ['CAUTION', 'The lid', 'can snap', 'Hold it.', '1,2'],
    ]);
  });

  it.each([
    ['a bold word', '**Warning** Hot oil can burn. Wait.'],
    ['capitals without a colon', 'WARNING Hot oil can burn. Wait.'],
    ['a dash', 'Warning - Hot oil can burn. Wait.'],
    ['a heading of its own', '### Warning\n\nHot oil can burn. Wait.'],
    ['a line of its own', '**WARNING**\n\nHot oil can burn. Wait.'],
    ['a quotation', '> Warning: Hot oil can burn. Wait.'],
    ['a point of a list', '- Warning: Hot oil can burn. Wait.'],
    ['emphasis inside', 'Warning: Hot *oil* can **burn**. Wait.'],
  ])('are known by %s', (_, words) => {
    expect(brief(`# T\n\n## One\n\n${words}\n\nThen pull.\n`)).toEqual([
      ['WARNING', 'Hot oil', 'can burn', 'Wait.', '1'],
    ]);
  });

  it('take one sentence out of the middle of a paragraph, and leave the work there', () => {
    const { source } = read('# T\n\n## One\n\nPull it. Warning: the edge can cut. Then turn it.\n');
    expect(source).toContain('Pull it. Then turn it.');
    expect(source).toContain('hazard: The edge');
  });

  it.each(['WARNING:', '**WARNING:**'])('are found behind the title of a numbered point: %s', (signal) => {
    const text = `# T\n\n1. Drain the fuel. ${signal} Petrol can burn. Keep flames away.\n2. Go on\n`;
    expect(brief(text)).toEqual([['WARNING', 'Petrol', 'can burn', 'Keep flames away.', '1,2']]);
    expect(read(text).steps.map(({ title }) => title)).toEqual(['Drain the fuel', 'Go on']);
  });

  it.each(['WARNING:', '**WARNING**', 'WARNING.'])('are no title of a numbered point: %s', (signal) => {
    const text = `# T\n\n1. ${signal} Hot oil can burn. Drain the sump.\n2. Go on\n`;
    expect(brief(text)).toEqual([['WARNING', 'Hot oil', 'can burn', AVOID, '1']]);
    expect(read(text).steps.map(({ title }) => title)).toEqual(['Drain the sump', 'Go on']);
  });

  it('guard their own numbered point and the next where they stand inside it', () => {
    const text = '# T\n\n1. Drain the fuel\n\n   WARNING: Petrol can burn. Wait.\n\n2. Go on\n\n3. End\n';
    expect(brief(text)).toEqual([['WARNING', 'Petrol', 'can burn', 'Wait.', '1,2']]);
    expect(brief('# T\n\n1. First\n\nWARNING: Oil can burn. Wait.\n\n2. Second\n\n3. Third\n')[0]?.at(-1)).toBe('2');
    expect(brief('# T\n\n1. WARNING: Hot oil can burn.\n2. Drain it\n3. End\n')[0]?.at(-1)).toBe('1,2');
  });

  it('are not made of other sentences', () => {
    for (const words of [
      'Danger zones are marked.',
      'Take notice of it.',
      'Caution the others first.',
      'NOTICE the mark',
    ])
      expect(brief(`# T\n\n## One\n\n${words}\n`), words).toEqual([]);
  });

  it('are said once where a document says them twice', () => {
    const { cautions, leftOut } = read(
      '# T\n\n## One\n\nWarning: Hot oil can burn.\n\nA.\n\n## Two\n\nWarning: Hot oil can burn.\n\nB.',
    );
    expect(cautions.map(({ steps }) => steps)).toEqual([[1, 2]]);
    expect(leftOut).toMatchObject([{ what: 'Caution that is said again', where: 'step 2: Two' }]);
  });

  it('stand in the prose where a sheet holds no more of them', () => {
    const many = Array.from({ length: 33 }, (_, i) => `Warning: Part ${i} can cut.`).join('\n\n');
    const { cautions, source } = read(`# T\n\n## One\n\n${many}\n\nGo.`);
    expect(cautions).toHaveLength(30);
    expect(source).toContain('WARNING: Part 32 can cut.');
  });
});
