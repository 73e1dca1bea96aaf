import fc from 'fast-check';
import { expect, it } from 'vitest';
import type { ImportedSheet } from '@/domain/api/schemas/imports';
import { parseProcedure } from '@/domain/procedure/parse';
import { importMarkdown } from '@/domain/writing/import/importHowTo';
import { lost } from '../../../factories/words';

/** All that whoever imports can read of a document afterwards, without ids and keys. */
const readable = ({ source, leftOut }: ImportedSheet) =>
  [
    source.replace(/^ *-? ?key: .*$/gm, '').replace(/<Caution of="[^"]*" \/>|<Step id="[^"]*"/g, ''),
    ...leftOut.map(({ quote }) => quote),
  ].join('\n');

// Words that stand nowhere else, so that none can be covered by another or by a marker of ours.
let count = 0;
const word = fc.constant(null).map(() => `w${(count += 1)}q`);
const words = (max = 6) => fc.array(word, { minLength: 1, maxLength: max }).map((some) => some.join(' '));
const number = fc
  .tuple(fc.nat({ max: 99 }), fc.constantFrom('N·m', 'mm', 'ft-lb', 'bar'))
  .map(([n, unit]) => `${n} ${unit}`);

const inline = fc.oneof(
  { weight: 6, arbitrary: words() },
  words(2).map((text) => `**${text}**`),
  words(2).map((text) => `*${text}*`),
  words(2).map((text) => `\`${text}\``),
  words(2).map((text) => `~~${text}~~`),
  fc.tuple(words(2), word).map(([text, host]) => `[${text}](https://${host}.example/)`),
  fc.tuple(words(2), word, words(2)).map(([text, host, title]) => `[${text}](http://${host}.example "${title}")`),
  fc.tuple(words(2), word).map(([alt, file]) => `![${alt}](${file}.png)`),
  words(2).map((text) => `<b class="${text}">${text}</b>`),
  words(2).map((text) => `10<sup>2</sup>${text}`),
  number,
  words(2).map((text) => `{${text}}`),
  words(2).map((text) => `<${text.replace(/ /g, '')} `),
);
const sentence = fc.array(inline, { minLength: 1, maxLength: 5 }).map((parts) => `${parts.join(' ')}.`);
const signal = fc.constantFrom('Danger', 'WARNING', 'Caution', 'Notice');
const paragraph = fc.oneof(
  { weight: 4, arbitrary: fc.array(sentence, { minLength: 1, maxLength: 3 }).map((all) => all.join(' ')) },
  fc.tuple(signal, sentence, sentence).map(([said, a, b]) => `${said}: ${a} ${b}`),
  fc.tuple(sentence, signal, sentence, sentence).map(([a, said, b, c]) => `${a} ${said}: ${b} ${c}`),
  fc.tuple(signal, words(8)).map(([said, text]) => `**${said}**\n\n${text}`),
);
const list = fc
  .tuple(fc.constantFrom('-', '1.'), fc.array(paragraph, { minLength: 1, maxLength: 4 }))
  .map(([mark, items]) => items.map((item) => `${mark} ${item.replace(/\n+/g, ' ')}\n\n   - inner`).join('\n'));
const table = fc
  .array(fc.array(words(2), { minLength: 2, maxLength: 2 }), { minLength: 1, maxLength: 3 })
  .map((rows) => `| a | b |\n| - | - |\n${rows.map((cells) => `| ${cells.join(' | ')} |`).join('\n')}`);
const block = fc.oneof(
  { weight: 5, arbitrary: paragraph },
  list,
  table,
  paragraph.map((text) => `> ${text.replace(/\n+/g, '\n> ')}`),
  fc.tuple(word, words()).map(([lang, text]) => `\`\`\`${lang}\n${text}\n\`\`\``),
  words().map((text) => `<div title="${text}">\n${text}\n</div>`),
  fc.tuple(fc.constantFrom('##', '###', '####'), words(20)).map(([level, text]) => `${level} ${text}`),
  fc.constantFrom('## Parts', '## Tools', '## Procedure', '## Warning', '---'),
  fc.tuple(word, words()).map(([label, text]) => `x[^${label}]\n\n[^${label}]: ${text}`),
);
const document = fc
  .tuple(fc.boolean(), words(), fc.array(block, { minLength: 1, maxLength: 9 }))
  .map(([titled, title, blocks]) => [...(titled ? [`# ${title}`] : []), ...blocks, 'last words'].join('\n\n'));

it('every word of a text in Markdown stands in the draft or in the list, and the draft can be read', () => {
  fc.assert(
    fc.property(document, (markdown) => {
      const read = importMarkdown(markdown);
      expect(read.ok ? '' : read.message).toBe('');
      if (!read.ok) return;
      // The digits before the points of a list are made by the list, in the text as in the sheet.
      const source = markdown.replace(/^\s*(>\s*)*\d+\.(?=\s)/gm, '').replace(/10<sup>2<\/sup>/g, '10 sup 2 sup ');
      expect(lost(source, readable(read.imported).replace(/10²/g, '10 2 '))).toEqual([]);
      expect(parseProcedure(read.imported.source).ok).toBe(true);
    }),
    { numRuns: 150 },
  );
});

it('no number becomes a value', () => {
  fc.assert(
    fc.property(document, (markdown) => {
      const read = importMarkdown(markdown);
      expect(read.ok && read.imported.source.split('\n---\n')[0]).not.toMatch(/^(torques|limits|timers):/m);
    }),
    { numRuns: 40 },
  );
});

it('any text at all is read or refused in a sentence, never with an exception', () => {
  fc.assert(
    fc.property(fc.string({ unit: 'binary', maxLength: 400 }), (text) => {
      const read = importMarkdown(text);
      if (!read.ok) expect(read.message).toMatch(/^.{10,400}$/s);
      else expect(parseProcedure(read.imported.source).ok).toBe(true);
    }),
    { numRuns: 200 },
  );
});
