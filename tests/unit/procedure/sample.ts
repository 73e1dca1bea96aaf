/** A small procedure in canonical form; tests change one place of it. */
export const SAMPLE = `---
title: Reseal the valve cover
summary: Replace the gasket and draw the cover down evenly.
system: sealing
engines:
  - tarn-t18f
minutes: 70
skill: apprentice
parts:
  - key: cover-gasket
    name: Cover gasket, moulded
    number: TN-4102
    quantity: 1
    action: replace
supplies:
  - key: silicone
    name: Silicone sealant
    skinOver: 10
    cure: 1440
torques:
  - key: cover-bolt
    name: Cover bolt
    thread: M6
    pitch: 1
    length: 25
    class: "8.8"
    condition: dry
    nm: 10
    tolerance: 1
    passes: [5]
    count: 4
    positions: [[0, 0], [200, 0], [200, 120], [0, 120]]
    order: [1, 3, 2, 4]
    source: demo
limits:
  - key: gap
    name: Gap at the corner
    quantity: length
    unit: mm
    max: 0.05
    resolution: 0.01
    condition: cold
    source: demo
  - key: weep
    name: Weep after warm-up
    quantity: finding
    expect: none allowed
    source: demo
cautions:
  - key: hot-oil
    signal: WARNING
    hazard: Hot oil and hot metal
    harm: burn skin at once
    avoid: Let the engine cool.
timers:
  - key: soak
    name: Soak the baffle
    kind: soak
    minutes: 10
figures:
  - key: underside
    file: cover-underside.svg
    alt: The underside of the cover with its "groove" marked.
    caption: Underside of the cover
sources:
  - key: demo
    kind: demonstration
    title: Demonstration values
---

Do this with the engine in the frame.

<Step id="cool" title="Let it cool">
<Caution of="hot-oil" />

Disconnect the battery. Soak the baffle, <Timer of="soak" />.

<Figure of="underside" />
</Step>

<Step id="draw-down" title="Draw the cover down">
Lay the new <Part of="cover-gasket" /> in its groove. Tighten first to <Torque of="cover-bolt" pass="1" />, then to <Torque of="cover-bolt" />, with a gap of <Limit of="gap" />.

<Hold>A senior technician checks the last pass, <Torque of="cover-bolt" />.</Hold>
</Step>

<Step id="check" title="Look for leaks">
Wait until the sealant has cured, <Timer of="silicone" stage="cure" />.

<Worksheet kind="readings" of="weep gap" />
</Step>
`;

/** SAMPLE with one place replaced; fails where that place does not exist. */
export function changed(from: string, to: string): string {
  if (!SAMPLE.includes(from)) throw new Error(`SAMPLE has no ${from}`);
  return SAMPLE.replace(from, () => to);
}

/** SAMPLE's front matter with this body. */
export const bodied = (body: string) => `${SAMPLE.slice(0, SAMPLE.indexOf('\n---\n', 4) + 5)}\n${body}\n`;

export const inStep = (inside: string) => bodied(`<Step id="one" title="One">\n${inside}\n</Step>`);

/** Line and column of the first place where `text` stands in `source`. */
export function placeIn(source: string, text: string): { line: number; column: number } {
  const at = source.indexOf(text);
  if (at < 0) throw new Error(`There is no ${text}`);
  const before = source.slice(0, at).split('\n');
  return { line: before.length, column: (before.at(-1) ?? '').length + 1 };
}
