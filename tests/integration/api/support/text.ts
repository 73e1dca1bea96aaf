/** A small, complete text; every part that tests vary is a parameter. */
export function text({ title = 'Reseal the test cover', nm = 10, word = 'clean', extra = '' } = {}): string {
  return `---
title: ${title}
summary: A short sheet that tests change and compare.
system: sealing
engines:
  - tarn-t18f
minutes: 30
skill: apprentice
torques:
  - key: cover-bolt
    name: Cover bolt
    thread: M6
    pitch: 1
    length: 25
    class: "8.8"
    condition: dry
    nm: ${nm}
    count: 4
    source: demo
sources:
  - key: demo
    kind: demonstration
    title: Demonstration values
---

<Step id="wipe" title="Wipe the joint">
Wipe both faces with a ${word} cloth.
</Step>

<Step id="tighten" title="Tighten the cover">
Tighten to <Torque of="cover-bolt" />.
</Step>
${extra}`;
}
