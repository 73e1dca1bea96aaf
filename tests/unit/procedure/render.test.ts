import { describe, expect, it } from 'vitest';
import { parseProcedure } from '@/domain/procedure/parse';
import { bodied, inStep, SAMPLE } from './sample';

function rendered(source: string) {
  const parsed = parseProcedure(source);
  if (!parsed.ok) throw new Error(JSON.stringify(parsed.errors));
  return parsed.rendered;
}
const html = (inside: string) => rendered(inStep(inside)).steps[0]?.html;

describe('rendering', () => {
  const { steps, introHtml } = rendered(SAMPLE);
  const [cool, draw, check] = steps;

  it('puts values in place in both unit systems', () => {
    expect(introHtml).toBe('<p>Do this with the engine in the frame.</p>');
    expect(draw?.html).toContain(
      'first to <span class="value" data-kind="torque" data-key="cover-bolt" data-pass="1"><span data-units="metric">5 N·m</span><span data-units="inch">44 lbf·in</span></span>, then',
    );
    expect(draw?.html).toContain('<span class="value" data-kind="part" data-key="cover-gasket">cover gasket</span>');
    expect(check?.html).toContain(
      '<span class="value" data-kind="timer" data-key="silicone" data-stage="cure">24 h</span>',
    );
  });

  it('keeps cautions and hold points out of the prose and names what stands in the margin', () => {
    expect(cool?.cautions).toEqual(['hot-oil']);
    expect(cool?.html).not.toContain('Hot oil');
    expect(draw?.html).not.toContain('senior');
    expect(draw?.holds).toEqual(['A senior technician checks the last pass, 10 ±1 N·m (89 ±9 lbf·in).']);
    expect(draw?.references).toEqual([
      { kind: 'part', key: 'cover-gasket' },
      { kind: 'torque', key: 'cover-bolt', pass: 1 },
      { kind: 'torque', key: 'cover-bolt' },
      { kind: 'limit', key: 'gap' },
    ]);
    expect(check?.references.at(-1)).toEqual({ kind: 'worksheet', worksheet: 'readings', keys: ['weep', 'gap'] });
  });

  it('gives plain words for the search', () => {
    expect(draw?.text).toBe(
      'Lay the new cover gasket in its groove. Tighten first to 5 N·m, then to 10 ±1 N·m, with a gap of 0.05 mm or less.\nA senior technician checks the last pass, 10 ±1 N·m.',
    );
    expect(cool?.text).toContain('Underside of the cover');
  });

  it('shows a figure with its description and caption, escaped', () => {
    expect(cool?.html).toContain(
      '<figure data-key="underside"><img src="/figures/cover-underside.svg" alt="The underside of the cover with its &#x22;groove&#x22; marked." loading="lazy" decoding="async"><figcaption>Underside of the cover</figcaption></figure>',
    );
  });

  it('gives a worksheet of readings as a table to write in', () => {
    expect(check?.html).toContain(
      '<table class="worksheet" data-worksheet="readings"><caption>Readings</caption><thead><tr><th scope="col">Measure</th><th scope="col">Limit</th><th scope="col">Reading</th></tr></thead>',
    );
    expect(check?.html).toContain('<th scope="row">Gap at the corner <small>cold</small></th>');
    expect(html('<Worksheet kind="injector-set" />')).toBe(
      '<p class="worksheet" data-worksheet="injector-set" data-bound="[]">Worksheet: injector set</p>',
    );
  });

  it('renders links, tables and escaped signs safely', () => {
    expect(html('[x](https://a.example/?a=1&b="2")')).toBe(
      '<p><a href="https://a.example/?a=1&#x26;b=&#x22;2&#x22;" rel="noopener">x</a></p>',
    );
    expect(html('| a | b |\n| - | -: |\n| 1 | 2 |')).toMatch(
      /^<table>\s*<thead>\s*<tr>\s*<th scope="col">a<\/th>\s*<th data-align="right" scope="col">b<\/th>\s*<\/tr>/,
    );
    expect(html('\\<script>alert(1)\\</script>')).toBe('<p>&#x3C;script>alert(1)&#x3C;/script></p>');
  });

  it('starts a sentence with a capital and nothing else', () => {
    expect(
      rendered(inStep('Lift the <Part of="cover-gasket" />. <Part of="cover-gasket" /> again.')).steps[0]?.text,
    ).toBe('Lift the cover gasket. Cover gasket again.');
  });

  it('gives nothing for a step without words', () => {
    const [only] = rendered(bodied('<Step id="a" title="A"></Step>')).steps;
    expect(only).toMatchObject({ html: '', text: '', references: [], holds: [] });
  });
});
