import { describe, expect, it } from 'vitest';
import { parseProcedure } from '@/domain/procedure/parse';
import { bodied, changed, inStep, SAMPLE } from './sample';

function read(source: string) {
  const parsed = parseProcedure(source);
  if (!parsed.ok) throw new Error(JSON.stringify(parsed.errors, null, 1));
  return parsed;
}

function faults(source: string) {
  const parsed = parseProcedure(source);
  return parsed.ok ? [] : parsed.errors;
}

describe('parseProcedure', () => {
  it('reads the sample, which is in canonical form', () => {
    const { procedure, canonical, notices } = read(SAMPLE);
    expect(canonical).toBe(SAMPLE);
    expect(notices).toEqual([]);
    expect(procedure.intro).toBe('Do this with the engine in the frame.');
    expect(procedure.steps.map((s) => [s.id, s.title, s.cautions])).toEqual([
      ['cool', 'Let it cool', ['hot-oil']],
      ['draw-down', 'Draw the cover down', []],
      ['check', 'Look for leaks', []],
    ]);
    expect(procedure.steps[0]?.body).toBe(
      'Disconnect the battery. Soak the baffle, <Timer of="soak" />.\n\n<Figure of="underside" />',
    );
    expect(procedure.frontmatter.critical).toBe(false);
    expect(procedure.frontmatter.tools).toEqual([]);
  });

  it('gives one text for one meaning, however it is typed', () => {
    const loose = SAMPLE.replace(/\n/g, '\r\n')
      .replace('skill: apprentice', 'critical: false\r\ntools: []\r\nskill: "apprentice"')
      .replace('passes: [5]', 'passes:\r\n      - 5.0')
      .replace('Do this with', 'Do   this\r\nwith')
      .replace('<Torque of="cover-bolt" pass="1" />', "<Torque pass='1' of='cover-bolt'></Torque>");
    expect(read(`\ufeff${loose}`).canonical).toBe(SAMPLE);
  });

  it('lifts a step and a hold written on one line out of their paragraph', () => {
    const { procedure } = read(
      bodied('<Step id="a" title="A">Do *it*.</Step>\n\n<Step id="b" title="B"><Hold>Look.</Hold></Step>'),
    );
    expect(procedure.steps.map((s) => s.body)).toEqual(['Do *it*.', '<Hold>Look.</Hold>']);
  });

  it('keeps a value that is a whole point of a list, and two on a line together', () => {
    const { procedure, rendered } = read(
      inStep('- <Part of="cover-gasket" />\n- <Torque of="cover-bolt" /> <Limit of="gap" />'),
    );
    expect(procedure.steps[0]?.body).toBe(
      '- <Part of="cover-gasket" />\n- <Torque of="cover-bolt" /> <Limit of="gap" />',
    );
    expect(rendered.steps[0]?.text).toBe('Cover gasket\n10 ±1 N·m 0.05 mm or less');
  });

  it('moves a caution that stands between steps into the next step', () => {
    const { procedure } = read(
      bodied('<Caution of="hot-oil" />\n\nFirst words.\n\n<Step id="a" title="A">\nDo it.\n</Step>'),
    );
    expect(procedure.intro).toBe('First words.');
    expect(procedure.steps[0]?.cautions).toEqual(['hot-oil']);
  });

  it('keeps signs of markup in titles', () => {
    const title = 'Nuts &amp; bolts &lt;b&gt; &quot;x&quot; &amp;amp; R&D *y*';
    const first = read(bodied(`<Step id="a" title="${title}">\nDo it.\n</Step>`));
    expect(first.procedure.steps[0]?.title).toBe('Nuts & bolts <b> "x" &amp; R&D *y*');
    expect(first.canonical).toContain('title="Nuts & bolts <b> &quot;x&quot; &amp;amp; R&D *y*"');
    expect(read(first.canonical).canonical).toBe(first.canonical);
  });
});

/** [what is tried, text, line, column, sentence, place in the form] */
const REFUSED: [string, string, number, number, string, string | undefined][] = [
  ['no front matter', 'Just words.', 1, 1, 'The text must begin with its front matter: a line of three hyphens, the fields, and again a line of three hyphens.', undefined],
  ['a caution behind prose', inStep('Do it.\n\n<Caution of="hot-oil" />'), 74, 1, 'A caution stands before what it guards. Move it to the start of the step, or to a step of its own.', 'steps.0.body'],
  ['a caution behind the last step', changed('of="weep gap" />\n</Step>', 'of="weep gap" />\n</Step>\n\n<Caution of="hot-oil" />'), 93, 1, 'This caution stands after the last step. Move it before the step it guards.', 'steps.2.cautions'],
  ['a step in a step', inStep('<Step id="b" title="B">\nx\n</Step>'), 72, 1, 'A step stands inside another step. Close the first one with </Step> before it.', 'steps.0.body'],
  ['the same id twice', changed('id="check"', 'id="cool"'), 87, 1, 'Step 1 already has the id "cool". Give this step its own.', 'steps.2.id'],
  ['no step', bodied('Words.'), 72, 1, 'A procedure needs at least one step: <Step id="first" title="What to do">.', 'steps'],
  ['words behind a step', `${SAMPLE}\nMore words.\n`, 93, 1, 'Only steps stand after the first step. Move this into the step before or behind it.', 'steps.2.body'],
  ['a hold in the introduction', changed('Do this with the engine in the frame.', '<Hold>Look.</Hold>'), 71, 1, 'Hold belongs into a step, not into the introduction.', 'intro'],
  ['a key that is not there', inStep('To <Torque of="cover-bold" />.'), 72, 12, '"cover-bold" is not among the torques. Did you mean "cover-bolt"?', 'steps.0.body'],
  ['a pass that is not there', inStep('To <Torque of="cover-bolt" pass="2" />.'), 72, 28, 'Pass "2" does not exist: Cover bolt has one pass before the final torque.', 'steps.0.body'],
  ['a stage that is not there', inStep('Wait <Timer of="silicone" stage="dry" />.'), 72, 27, 'Stage "dry" does not exist. Write skin-over or cure.', 'steps.0.body'],
  ['a supply without a stage', inStep('Wait <Timer of="silicone" />.'), 72, 13, '"silicone" is a supply: say which of its times, stage="skin-over" or stage="cure".', 'steps.0.body'],
  ['a worksheet that is not there', inStep('<Worksheet kind="reading" of="gap" />'), 72, 12, 'There is no worksheet "reading". Did you mean "readings"?', 'steps.0.body'],
  ['a worksheet of readings without limits', inStep('<Worksheet kind="readings" />'), 72, 1, 'A worksheet of readings names the limits to read, for example of="end-float preload".', 'steps.0.body'],
  ['an unknown component', inStep('To <Torqe of="cover-bolt" />.'), 72, 4, 'There is no component "Torqe". Did you mean Torque?', 'steps.0.body'],
  ['HTML', inStep('So <b>bold</b>.'), 72, 4, 'HTML is not used. Remove <b> and write plain text with the components of the sheet.', 'steps.0.body'],
  ['an unknown attribute', inStep('To <Torque off="cover-bolt" />.'), 72, 12, 'Torque has no attribute "off". Did you mean "of"?', 'steps.0.body'],
  ['an expression as a value', inStep('To <Torque of={bolt} />.'), 72, 12, 'Curly brackets have no place here. Torque is written <Torque of="cover-bolt" />.', 'steps.0.body'],
  ['a missing attribute', inStep('To <Torque />.'), 72, 4, 'Torque needs of="…": <Torque of="cover-bolt" />.', 'steps.0.body'],
  ['words in a value', inStep('To <Torque of="cover-bolt">ten</Torque>.'), 72, 4, 'Torque holds no words of its own. Write <Torque of="cover-bolt" />.', 'steps.0.body'],
  ['a value torn out of its sentence', inStep('Tighten to\n<Torque of="cover-bolt" />\nin one go.'), 73, 1, 'Torque stands inside a sentence. Write it on the same line as its words.', 'steps.0.body'],
  ['a hold among words', inStep('First <Hold>look</Hold> then go.'), 72, 7, 'Hold stands on its own: put it on a line by itself, with a blank line before and after, and not inside a list, a quotation or a table.', 'steps.0.body'],
  ['a figure in a list', inStep('- <Figure of="underside" />'), 72, 3, 'Figure stands on its own: put it on a line by itself, with a blank line before and after, and not inside a list, a quotation or a table.', 'steps.0.body'],
  ['an expression', inStep('It is {1 + 1}.'), 72, 7, 'Curly brackets have no place in a sheet. Remove them, or write \\{ for the sign itself.', 'steps.0.body'],
  ['an import', inStep("import x from './y'\n\nWords."), 72, 1, 'Imports and exports are not used: a sheet is text, not a program. Remove this line.', 'steps.0.body'],
  ['an export', inStep('export const x = 1'), 72, 1, 'Imports and exports are not used: a sheet is text, not a program. Remove this line.', 'steps.0.body'],
  ['a comment', inStep('<!-- later -->'), 72, 2, 'Comments and HTML are not kept in a sheet. Remove this one.', 'steps.0.body'],
  ['less than', inStep('A gap <5 is small.'), 72, 8, 'The sign < opens a component. Write \\< where you mean "less than", and [words](https://address) for a link.', 'steps.0.body'],
  ['a heading', inStep('# Title'), 72, 1, 'Headings are not used: each step has its title. Remove the # or the underline, or start a new step.', 'steps.0.body'],
  ['an image', inStep('![x](https://a.example/y.png)'), 72, 1, 'Images are not placed in the text. Describe the drawing under figures and place it with <Figure of="…" />.', 'steps.0.body'],
  ['a footnote', inStep('Words.[^1]\n\n[^1]: More.'), 72, 7, 'Footnotes are not used. Say it in the step, or name a source in the front matter.', 'steps.0.body'],
  ['a link definition', inStep('[x]: https://a.example'), 72, 1, 'Link definitions are not used. Write the address where the link stands: [words](https://address).', 'steps.0.body'],
  ['a script address', inStep('[x](java&#115;cript:alert(1))'), 72, 1, 'A link goes to an address that starts with https:// or to a path of this book, such as /handbook/signal-words.', 'steps.0.body'],
  ['a row with too many cells', inStep('| a | b |\n| - | - |\n| 1 | 2 | 3 |'), 74, 9, 'This row has 3 cells, the first row 2. Give every row as many.', 'steps.0.body'],
  ['an unclosed step', bodied('<Step id="a" title="A">\nWords.'), 71, 1, '<Step> is opened and not closed. Put <Step> and </Step> on lines of their own, or both on one line.', 'steps.0.body'],
]; // prettier-ignore

describe('what is refused', () => {
  it.each(REFUSED)('%s', (_, source, line, column, message, path) => {
    expect(faults(source)[0]).toEqual(path === undefined ? { line, column, message } : { line, column, message, path });
  });

  it('tells everything that is wrong, in reading order', () => {
    const found = faults(
      changed('nm: 10\n', 'nm: ten\n').replace('pass="1"', 'pass="9" x="1"').replace('id="check"', 'id="Check"'),
    );
    expect(found.map((f) => f.path)).toEqual(['torques.0.nm', 'steps.1.body', 'steps.2.id']);
  });
});
