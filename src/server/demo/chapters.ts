import type { Procedure } from '@/domain/procedure/types';
import type { Drawing } from './drawings';
import { entry, stepIndex } from './editing';

/** How a chapter ends; days are counted back from the day the demonstration is made. */
export type End =
  /** `agreed` give their agreement first; whoever publishes agrees by that. */
  | { published: number; by: string; agreed?: readonly string[] }
  | { returned: number; by: string; reason: string; anchor: string }
  | { waiting: true; agreed: readonly string[] };

interface Told {
  /** E-mail of the author. */
  author: string;
  /** Days back when it was sent in. */
  sentIn: number;
  reason: string;
  end: End;
  /** What stands at the reason in place of a photo. */
  shows?: Drawing;
  /** What was asked about it while it waits. */
  asked?: { by: string; anchor: string; question: string; shows?: Drawing };
}

/** A change to a sheet of the common book. */
export interface Change extends Told {
  number: string;
  change: (procedure: Procedure) => void;
}

/** A new sheet of the author's shop, from `content/demonstration`. */
export interface NewSheet extends Told {
  file: string;
}

/** A sheet that is taken out of use, and stays so. */
export interface Withdrawal {
  number: string;
  withdrawn: number;
  by: string;
  reason: string;
}

export type Chapter = Change | NewSheet | Withdrawal;

/** What happened in the demonstration network before today, oldest first. All of it is invented. */
export const CHAPTERS: readonly Chapter[] = [
  {
    number: 'P-0142',
    author: 'senior@northgate.example',
    sentIn: 74,
    reason:
      'Two covers came back with a drip at one bolt each. Both times a washer had been put back split. Counting them makes people look.',
    change: (p) => {
      entry(p, 'parts', 'cover-bolt').note =
        'Replace any washer that is hard, split or pressed flat, and write down how many you replaced.';
    },
    end: { published: 72, by: 'editor2@halden.example' },
  },
  {
    file: 'pierstreet-receive-engine.mdx',
    author: 'senior@pierstreet.example',
    sentIn: 60,
    reason: 'We lost an argument over a cracked ear in August. This is how we have booked engines in since then.',
    end: { published: 58, by: 'editor@pierstreet.example' },
  },
  {
    file: 'sawmill-winter-lay-up.mdx',
    author: 'owner@sawmill.example',
    sentIn: 50,
    reason: 'Four boats stay afloat this winter, and each of us has been doing it a little differently.',
    end: { published: 48, by: 'editor@sawmill.example' },
  },
  {
    number: 'P-0137',
    author: 'senior@pierstreet.example',
    sentIn: 38,
    reason:
      'Six of us watched the same valve and called its opening up to three degrees apart. With a thread in it, it drops, and everybody calls the same figure.',
    change: (p) => {
      entry(p, 'limits', 'opening').condition =
        'stirred water, warmed slowly, hung clear of the pan by a thread in its valve; it opens when the thread lets go';
    },
    end: { published: 34, by: 'editor@halden.example', agreed: ['editor2@halden.example'] },
  },
  {
    number: 'P-0142',
    author: 'senior@pierstreet.example',
    sentIn: 19,
    reason:
      'Wiped and judged at once, an edge looks dry that weeps by the time the bonnet is down. Of nine covers, three showed it only after a quarter of an hour.',
    change: (p) => {
      entry(p, 'timers', 'stand').minutes = 15;
    },
    end: { published: 17, by: 'editor@halden.example' },
  },
  {
    number: 'P-0173',
    withdrawn: 12,
    by: 'editor2@halden.example',
    reason:
      'Northgate and Pier Street caught the return of the same four injectors and read them up to 6 mL apart, warm and at the same idle. One of us would have scrapped a good set. Until we know what makes the difference, send a doubtful injector out to be tested.',
  },
  {
    number: 'P-0181',
    author: 'owner@sawmill.example',
    sentIn: 9,
    reason: 'Two pumps at 0.36 mm still primed within ten seconds, so the limit is tighter than it need be.',
    change: (p) => {
      entry(p, 'limits', 'end-clearance').max = 0.4;
    },
    end: {
      returned: 8,
      by: 'editor@halden.example',
      reason:
        'Priming is not cooling. Give the flow at the exhaust at that clearance, for both pumps and at full speed, and how many hours they then ran.',
      anchor: 'limits.end-clearance',
    },
  },
  {
    number: 'P-0142',
    author: 'senior@pierstreet.example',
    sentIn: 3,
    reason:
      'Three covers came back weeping at the rear corner. The new sealing washers take a set in their first heat, and at ten they are then loose. Twelve, and a look at the rear bolts before it is run, has kept the last five dry.',
    change: (p) => {
      Object.assign(entry(p, 'torques', 'cover-bolt'), { nm: 12, passes: [6] });
      p.steps.splice(stepIndex(p, 'check'), 0, {
        id: 'rear-corner',
        title: 'Go back to the rear corner',
        cautions: [],
        body: 'Put the wrench on the two rear bolts once more, to <Torque of="cover-bolt" />. If either turns, say so on the job card before you start the engine.',
      });
    },
    end: { waiting: true, agreed: ['editor2@halden.example'] },
    shows: 'washers',
    asked: {
      by: 'editor2@halden.example',
      anchor: 'step:rear-corner',
      question:
        'Only the two rear bolts, or once round all eleven? If a washer sets at the back, I would expect it at the front too. What did your five show?',
      shows: 'corner',
    },
  },
  {
    number: 'P-0137',
    author: 'technician@northgate.example',
    sentIn: 1,
    reason:
      'An apprentice tested one lying on the bottom of the pan and condemned it. The tool list is where they look.',
    change: (p) => {
      entry(p, 'tools', 'pan').note = 'Nothing may touch the bottom: the pan is hotter there than the water.';
    },
    end: { waiting: true, agreed: [] },
  },
];
