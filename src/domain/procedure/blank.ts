import { ENGINE_TO_FILL_IN } from './fillIn';

/**
 * The empty sheet: the bones of any job, with a marker wherever the author must write. In canonical form. It holds no
 * value, so that none can be left standing by mistake.
 */
export const BLANK_PROCEDURE = `---
title: A new procedure
summary: "Fill in: what is done, and what comes out of it. Set the system, the bench time and the skill too; what stands there is only a start."
system: checks
engines:
  - ${ENGINE_TO_FILL_IN}
minutes: 60
skill: technician
cautions:
  - key: first-hazard
    signal: WARNING
    hazard: "Fill in: what can hurt, as the thing that does it."
    harm: "Fill in: what it does, and to whom."
    avoid: "Fill in: what to do so that it does not. Choose the signal word by what can happen, or remove this caution."
---

Fill in: when this job is done, and what usually brings the engine in for it.

<Step id="make-safe" title="Make it safe">
<Caution of="first-hazard" />

Fill in: what is switched off, let down, drained or left to cool before a tool comes out.
</Step>

<Step id="do-the-work" title="Do the work">
Fill in: one action after the other. Put each torque and limit under the sheet's values, with where it comes from, and point at it here.
</Step>

<Step id="check" title="Check it">
Fill in: what is measured or looked at before the engine is handed over, and what it must show.

<Hold>Fill in: what a senior technician looks at before the work goes on, or remove this hold point.</Hold>
</Step>
`;
