import { renderToStaticMarkup } from 'react-dom/server';
import { describe, expect, it } from 'vitest';
import { BigValue } from '@/components/sheet/Value';
import { ReadSheet } from '@/components/sheet/ReadSheet';
import type { Sheet } from '@/domain/api/schemas/book';
import { parseProcedure } from '@/domain/procedure/parse';

const SOURCE = `---
title: Refit the drain plug
summary: Fit a new washer and tighten the plug.
system: lubrication
engines: [tarn-t18f]
minutes: 15
skill: apprentice
torques:
  - key: plug
    name: Drain plug
    thread: M14
    pitch: 1.5
    condition: dry
    nm: 30
    passes: [15]
    count: 4
    positions: [[0, 0], [60, 0], [60, 40], [0, 40]]
    order: [2, 4, 1, 3]
cautions:
  - key: slip
    signal: NOTICE
    hazard: Oil on the floor
    harm: spoils the joint
    avoid: Wipe it up.
  - key: hot
    signal: WARNING
    hazard: Hot oil
    harm: burns skin
    avoid: Let it cool.
---

<Step id="fit" title="Fit it">
<Caution of="slip" />

<Caution of="hot" />

First to <Torque of="plug" pass="1" />, then to <Torque of="plug" />.

<Hold>A senior technician looks at it.</Hold>
</Step>
`;

function sheetOf(letter: string): Sheet {
  const parsed = parseProcedure(SOURCE);
  if (!parsed.ok) throw new Error(parsed.errors.map(({ message }) => message).join('\n'));
  const author = { id: 'a', name: 'Mika Thornbury', shop: null };
  return {
    number: 'P-0900',
    title: parsed.rendered.frontmatter.title,
    book: { kind: 'common', shopId: null, name: 'Common book' },
    revision: {
      letter,
      state: letter === 'B' ? 'published' : 'superseded',
      hash: '7f3a91c0'.repeat(8),
      sheetCheck: '7f3a91c0',
      publishedAt: '2026-11-14T23:30:00.000Z',
      reason: '',
      author,
      reviewers: [],
      overrides: [],
    },
    current: { letter: 'B', publishedAt: '2026-11-20T08:00:00.000Z' },
    earlier: letter === 'B' ? 1 : 0,
    withdrawn: null,
    openProposals: 0,
    ...parsed.rendered,
    source: SOURCE,
  };
}

const shown = (letter = 'B', mayPropose = true) =>
  renderToStaticMarkup(
    <ReadSheet
      sheet={sheetOf(letter)}
      engines={[{ key: 'tarn-t18f', name: 'Tarn T18F' }]}
      mayPropose={mayPropose}
      units="metric"
    />,
  );
const steps = (html: string) => html.slice(html.indexOf('id="step-fit"'));

describe('a sheet on the page', () => {
  it('shows the cautions of a step ahead of its words, the worst first', () => {
    const html = steps(shown());
    const places = ['WARNING<', 'NOTICE<', '<h3', 'First to'].map((text) => html.indexOf(text));
    expect(places).not.toContain(-1);
    expect(places).toEqual([...places].sort((a, b) => a - b));
  });

  it('puts the alert symbol on every word but NOTICE, which never concerns a person', () => {
    const html = steps(shown());
    const before = (word: string) => html.slice(html.indexOf(`${word}</p>`) - 120, html.indexOf(`${word}</p>`));
    expect(before('WARNING')).toContain('</svg>');
    expect(before('NOTICE')).not.toContain('</svg>');
  });

  it('says beside a value that nobody stated its source', () => {
    expect(steps(shown())).toContain('No source stated');
  });

  it('gathers the passes of a torque under its final value and draws the order with the first bolt filled', () => {
    const html = steps(shown());
    expect(html.match(/<h4/g)).toHaveLength(1);
    expect(html).toContain('First pass');
    const drawing = html.slice(html.indexOf('role="img"'), html.indexOf('</svg>', html.indexOf('role="img"')));
    expect(drawing.match(/fill-petrol/g)).toHaveLength(1);
    // Bolt 2 stands upper right and is tightened first.
    expect(html.slice(html.indexOf('<ol'))).toMatch(/^<ol[^>]*><li>upper right/);
  });

  it('names the hold point, and the sheet check as it is read aloud', () => {
    expect(shown()).toContain('<b class="font-semibold">Hold point.</b> A senior technician looks at it.');
    expect(shown()).toContain('7f3a 91c0');
  });

  it('dates by UTC', () => {
    expect(shown()).toContain('14 Nov 2026');
  });

  it('warns on a superseded revision, links to the current one and offers no change to it', () => {
    const html = shown('A');
    expect(html).toContain('Do not work from this sheet');
    expect(html).toContain('href="/procedures/P-0900"');
    expect(html).not.toContain('Propose a change');
    expect(shown('B')).not.toContain('Do not work from this sheet');
  });

  it('offers a change only to whoever may propose one', () => {
    expect(shown('B', true)).toContain('action="/procedures/P-0900/propose"');
    expect(shown('B', false)).not.toContain('/propose');
  });
});

describe('the value in the margin', () => {
  const big = (text: string) => renderToStaticMarkup(<BigValue text={{ metric: text, inch: text }} />);
  it.each([
    ['10 ±1 N·m', '<span>10</span><span class="text-lead font-medium"> ±1 N·m</span>'],
    ['0.03 to 0.06 mm', '<span class="text-title">0.03 to 0.06</span><span class="text-lead font-medium"> mm</span>'],
    ['132.00 (131.80 or more) mm', '<span>132.00</span><span class="text-lead font-medium"> mm</span>'],
    ['40 N·m, then 90° and 90°', '<span class="block text-lead font-semibold">then 90° and 90°</span>'],
    ['none allowed', 'none allowed'],
  ])('sets the number of "%s" largest and loses nothing', (text, part) => {
    expect(big(text)).toContain(part);
    const words = big(text).replace(/<[^>]+>/g, ' ');
    for (const word of text.split(/[\s(),]+/)) expect(words).toContain(word);
  });
});
