/**
 * What a new procedure starts from: a short sheet that is complete and in canonical form, so that the author
 * writes over a good example instead of facing an empty page. Invented task, demonstration values.
 */
export const BLANK_PROCEDURE = `---
title: Fit the inspection cover
summary: "An example to write over: close the inspection opening with a new gasket, and prove that it holds oil."
system: sealing
engines:
  - tarn-t18f
minutes: 30
skill: technician
parts:
  - key: gasket
    name: Inspection cover gasket
    quantity: 1
    action: replace
tools:
  - key: torque-wrench
    name: Torque wrench
    range: 2 to 25 N·m
  - key: straightedge
    name: Straightedge and feeler gauges
torques:
  - key: cover-screw
    name: Cover screw
    thread: M6
    pitch: 1
    length: 16
    class: "8.8"
    condition: dry
    nm: 9
    tolerance: 1
    passes: [4]
    count: 4
    positions: [[0, 0], [80, 0], [80, 60], [0, 60]]
    order: [1, 3, 2, 4]
    source: demo
limits:
  - key: flatness
    name: Gap under the straightedge, anywhere on the face
    quantity: length
    unit: mm
    max: 0.1
    resolution: 0.05
    condition: face clean and cold
    source: demo
cautions:
  - key: hot-oil
    signal: WARNING
    hazard: Hot oil
    harm: burns skin at once
    avoid: Let the engine cool until you can rest a bare hand on the cover before you take out a screw.
sources:
  - key: demo
    kind: demonstration
    title: Demonstration values
    detail: Write over them, and say where your own values come from.
---

Say in a sentence or two when this job is done, and what usually brings the engine in for it.

<Step id="clean-and-measure" title="Clean the face and measure it">
<Caution of="hot-oil" />

Lift the cover, pull off the old <Part of="gasket" />, and wipe the face until a white cloth stays white.

Lay the straightedge across both diagonals and try a feeler under it. It must show <Limit of="flatness" />. A face that shows more is not saved by a thicker gasket: stop and fetch a senior technician.
</Step>

<Step id="close-the-cover" title="Close the cover in two passes">
Lay the new gasket dry. Run all four screws in by hand until the heads just touch.

Tighten in the order shown, first to <Torque of="cover-screw" pass="1" />, then to <Torque of="cover-screw" />. A screw that still turns on a last round has dirt under the gasket: take the cover off again and look.

<Hold>A senior technician watches the last pass and looks along the edge for an even gap before oil goes in.</Hold>
</Step>

<Step id="look-for-leaks" title="Run it and look for leaks">
Run the engine until the fan has cycled once. Stop it, wipe the edge with a clean white cloth, and look at the cloth: a trace of oil means the cover comes off again. Never tighten past the sheet to stop a weep.

<Worksheet kind="readings" of="flatness" />
</Step>
`;
