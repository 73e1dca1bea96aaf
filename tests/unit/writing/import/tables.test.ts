import { expect, it } from 'vitest';
import { importHtml } from '@/domain/writing/import/importHowTo';

it('keeps numbers in their row and column where a cell spans rows, and tells it', () => {
  const html =
    '<h1>T</h1><h2>Set it</h2><table><tr><th>Valve</th><th>Side</th><th>Gap</th></tr>' +
    '<tr><td rowspan="2">Inlet</td><td>left</td><td>one</td></tr><tr><td>right</td><td>two</td></tr></table>';
  const read = importHtml(html, 'T Set it Valve Side Gap Inlet left one right two', []);
  if (!read.ok) throw new Error(read.message);
  expect(read.imported.source).toContain('| Inlet | left | one |\n| Inlet | right | two |');
  expect(read.imported.leftOut).toMatchObject([{ what: 'Merged cells of a table' }]);
});
