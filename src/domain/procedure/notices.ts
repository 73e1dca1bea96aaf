import type { Nodes, RootContent } from 'mdast';
import { limitKeysIn } from './bindings';
import { checkOrder } from '../measure/order/check';
import type { DraftBody } from './body';
import { clampChecks } from './clamp';
import { betweenSteps, coarseTool } from './gauge';
import { elementsIn, given } from './references';
import { problem, type PlaceOf } from './problems';
import { figuresInProse } from './proseFigures';
import type { Frontmatter } from './schema';
import type { SourceProblem } from './types';

/** What a reading leaves for the check. */
export interface Noticed {
  frontmatter: Frontmatter;
  placeOf: PlaceOf;
  body: DraftBody;
}

type Rule = (read: Noticed) => SourceProblem[];

const allNodes = ({ intro, steps }: DraftBody): RootContent[] => [...intro, ...steps.flatMap((s) => s.children)];

function keysUsed(body: DraftBody, ...names: string[]): Set<string> {
  return new Set(
    elementsIn(allNodes(body))
      .filter((e) => names.includes(e.name ?? ''))
      .flatMap((e) => limitKeysIn(given(e)['of'])),
  );
}

/** A value that no step uses is either forgotten in the steps or left over in the front matter. */
const unused: Rule = ({ frontmatter, placeOf, body }) => {
  const uses = {
    torques: [keysUsed(body, 'Torque'), 'Torque'],
    limits: [keysUsed(body, 'Limit', 'Worksheet'), 'Limit'],
    timers: [keysUsed(body, 'Timer'), 'Timer'],
    figures: [keysUsed(body, 'Figure'), 'Figure'],
  } as const;
  return (Object.keys(uses) as (keyof typeof uses)[]).flatMap((list) => {
    const [used, word] = uses[list];
    return frontmatter[list].flatMap((entry, i) => {
      if (used.has(entry.key)) return [];
      const called = 'name' in entry ? entry.name : entry.caption;
      return [problem(placeOf([list, i, 'key']), `${word} ${i + 1} (${called}) is used in no step.`, `${list}.${i}`)];
    });
  });
};

const cautionsNowhere: Rule = ({ frontmatter, placeOf, body }) => {
  const used = new Set(body.steps.flatMap((s) => s.cautions));
  return frontmatter.cautions.flatMap((caution, i) =>
    used.has(caution.key)
      ? []
      : [
          problem(
            placeOf(['cautions', i, 'key']),
            `Caution ${i + 1} (${caution.hazard}) stands before no step. Put it before the step it guards.`,
            `cautions.${i}`,
          ),
        ],
  );
};

/** Every value says where it comes from, or that it says nothing. */
const withoutSource: Rule = ({ frontmatter, placeOf }) =>
  (['torques', 'limits'] as const).flatMap((list) =>
    frontmatter[list].flatMap((entry, i) =>
      entry.source
        ? []
        : [
            problem(
              placeOf([list, i, 'key']),
              `${list === 'torques' ? 'Torque' : 'Limit'} ${i + 1} (${entry.name}) names no source. Say where the value comes from.`,
              `${list}.${i}.source`,
            ),
          ],
    ),
  );

const untimedSupplies: Rule = ({ frontmatter, placeOf, body }) => {
  const timed = new Set(
    elementsIn(allNodes(body))
      .filter((e) => e.name === 'Timer')
      .map((e) => `${given(e)['of'] ?? ''} ${given(e)['stage'] ?? ''}`),
  );
  return frontmatter.supplies.flatMap((supply, i) =>
    supply.cure === undefined || timed.has(`${supply.key} cure`)
      ? []
      : [
          problem(
            placeOf(['supplies', i, 'cure']),
            `Supply ${i + 1} (${supply.name}) has a cure time, but no step waits for it: <Timer of="${supply.key}" stage="cure" />.`,
            `supplies.${i}.cure`,
          ),
        ],
  );
};

const emptySteps: Rule = ({ body }) =>
  body.steps.flatMap((step, i) =>
    step.children.length
      ? []
      : [problem(step.place, `Step ${i + 1} (${step.title}) has a title and no words.`, `steps.${i}.body`)],
  );

function writtenOut(nodes: readonly Nodes[], path: string): SourceProblem[] {
  return nodes.flatMap((node): SourceProblem[] => {
    if (node.type !== 'text') return 'children' in node ? writtenOut(node.children, path) : [];
    return figuresInProse(node.value).map(({ text, component, list }) =>
      problem(
        node.position?.start,
        `"${text}" is written out here. Where hands act on it, put it under ${list} and write <${component} of="…" />, so that it stands in one place.`,
        path,
      ),
    );
  });
}

const figuresWrittenOut: Rule = ({ body }) => [
  ...writtenOut(body.intro, 'intro'),
  ...body.steps.flatMap((step, i) => writtenOut(step.children, `steps.${i}.body`)),
];

/** A torque that its fastener cannot bear, hardly needs, or that was meant in another unit. */
const implausibleTorques: Rule = ({ frontmatter, placeOf }) =>
  clampChecks(frontmatter.torques).flatMap(({ name, path, verdict, message, mixUp }, i) => {
    const said = [...(verdict === 'over' || verdict === 'low' ? [message] : []), ...(mixUp ? [mixUp] : [])];
    if (said.length === 0) return [];
    return [problem(placeOf(['torques', i, 'nm']), `Torque ${i + 1} (${name}): ${said.join(' ')}`, `${path}.nm`)];
  });

/** A limit that its own tool cannot read, or not to the figure that it states. */
const coarseTools: Rule = ({ frontmatter, placeOf }) =>
  frontmatter.limits.flatMap((limit, i) => {
    const why = coarseTool(limit) ?? betweenSteps(limit);
    if (!why) return [];
    const place = placeOf(['limits', i, 'resolution']);
    return [problem(place, `Limit ${i + 1} (${limit.name}): ${why}`, `limits.${i}.resolution`)];
  });

/** An order that leaves the part to tip: not from the middle outward, or round a circle instead of across it. */
const oddOrders: Rule = ({ frontmatter, placeOf }) =>
  frontmatter.torques.flatMap(({ name, positions, order }, i) => {
    if (!positions || !order) return [];
    const checked = checkOrder(positions, order);
    if (!checked.ok) return [];
    return checked.value.findings.map(({ message }) =>
      problem(placeOf(['torques', i, 'order']), `Torque ${i + 1} (${name}): ${message}`, `torques.${i}.order`),
    );
  });

const RULES: readonly Rule[] = [
  implausibleTorques,
  coarseTools,
  oddOrders,
  unused,
  cautionsNowhere,
  withoutSource,
  untimedSupplies,
  emptySteps,
  figuresWrittenOut,
];

/** What a reviewer should look at in a text that is otherwise in order. */
export const noticesOf = (read: Noticed): SourceProblem[] => RULES.flatMap((rule) => rule(read));
