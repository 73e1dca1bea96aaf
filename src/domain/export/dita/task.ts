import { create } from 'xmlbuilder2';
import type { XMLBuilder } from 'xmlbuilder2/lib/interfaces';
import type { RenderedProcedure, RenderedStep } from '../../procedure/types';
import { cautionsOf, hazardStatement } from './hazard';
import { element, table } from './nodes';
import { prereq } from './prereq';
import { prolog, type TaskFacts } from './prolog';
import { writeProse, type Places } from './prose';
import { stepRows, VALUE_COLUMNS } from './valueRows';

const STANDING: Record<TaskFacts['standing'], string | null> = {
  current: null,
  superseded: 'Superseded: do not work from this revision. A later one is the one to work from.',
  withdrawn: 'Withdrawn: do not work from this sheet.',
};

function step(steps: XMLBuilder, one: RenderedStep, procedure: RenderedProcedure, places: Places): void {
  const f = procedure.frontmatter;
  const made = element(steps, 'step', { id: one.id, importance: one.holds.length > 0 ? 'required' : undefined });
  // The DTD lets a hazard statement stand ahead of the command and nowhere else in a step.
  for (const caution of cautionsOf(one.cautions, f.cautions)) hazardStatement(made, caution);
  element(made, 'cmd', {}, one.title);
  if (one.html) writeProse(element(made, 'info'), one.html, places);
  const rows = stepRows(one.references, f);
  if (rows.length > 0) table(element(made, 'info'), 'Values of this step', VALUE_COLUMNS, rows);
  for (const hold of one.holds)
    element(element(made, 'info'), 'note', { type: 'important', outputclass: 'hold-point' }, `Hold point. ${hold}`);
}

/** Elements that begin a line, so that two revisions can be compared by lines. No blank is added among words. */
const LINES =
  /<(?:!DOCTYPE|task|title|shortdesc|prolog|author|critdates|metadata|prodinfo|othermeta|taskbody|prereq|context|steps|step|hazardstatement|typeofhazard|consequence|howtoavoid|cmd|info|note|p|ul|ol|li|table|row|entry|fig|image)[ >]/g;

/**
 * One sheet as a topic of the DITA 1.2 task type with the hazard statement domain (OASIS, 1 December 2010): its shell
 * `technicalContent/dtd/task.dtd` includes that domain.
 *
 * @returns the document, in UTF-8 once encoded
 */
export function ditaTask(procedure: RenderedProcedure, facts: TaskFacts, places: Places): string {
  const { frontmatter: f, introHtml, steps } = procedure;
  const doc = create({ version: '1.0', encoding: 'UTF-8' });
  const task = doc.ele('task', { id: facts.number.toLowerCase(), 'xml:lang': 'en' });
  element(task, 'title', {}, f.title);
  element(task, 'shortdesc', {}, f.summary);
  prolog(task, f, facts);
  const body = element(task, 'taskbody');
  const guarded = new Set(steps.flatMap(({ cautions }) => cautions));
  const atLarge = f.cautions.map(({ key }) => key).filter((key) => !guarded.has(key));
  prereq(body, f, cautionsOf(atLarge, f.cautions));
  const standing = STANDING[facts.standing];
  if (standing || introHtml) {
    const context = element(body, 'context');
    if (standing) element(context, 'note', { type: 'important' }, standing);
    if (introHtml) writeProse(context, introHtml, places);
  }
  if (steps.length > 0) {
    const list = element(body, 'steps');
    for (const one of steps) step(list, one, procedure, places);
  }
  doc.dtd({ name: 'task', pubID: '-//OASIS//DTD DITA 1.2 Task//EN', sysID: 'task.dtd' });
  return `${doc.end().replace(LINES, '\n$&')}\n`;
}
