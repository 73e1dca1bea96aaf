import { cpSync, readdirSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { toSource } from '@/domain/procedure/canonical';
import { Frontmatter } from '@/domain/procedure/schema';
import type { SearchDocument } from '@/domain/search/documents';
import { generatedDocuments } from '../../tests/factories/generatedBook';

/** Plain sentences to give a generated sheet the length of a real one: about 300 words over its steps. */
const SENTENCES = [
  'Look at the face before you touch it, and write down what you see.',
  'Turn it by hand through two full turns and feel for a tight place.',
  'Keep every washer with its own bolt, in the order they came out.',
  'A part that binds is telling you something; stop and find out what.',
  'Wipe the joint with a clean cloth until the cloth comes away white.',
  'Work from the middle outward and leave the last quarter turn for the wrench.',
  'Measure twice, a quarter turn apart, and keep both figures.',
  'If the two do not agree, fetch a senior technician before you go on.',
];

const key = (prefix: string, i: number) => `${prefix}-${i + 1}`;

/** The text of a procedure that a generated search document could have come from. */
export function sourceOf(document: SearchDocument, seed: number): string {
  const threads = (text: string) => {
    const [thread = 'M6', pitch] = text.split('×');
    return pitch ? { thread, pitch: Number(pitch) } : { thread };
  };
  const frontmatter = Frontmatter.parse({
    title: document.title.slice(0, 90),
    summary: document.summary.slice(0, 300),
    system: document.system,
    engines: document.engines,
    minutes: document.minutes,
    skill: document.skill,
    parts: document.parts.map((part, i) => ({
      key: key('part', i),
      name: part.name,
      ...(part.number && { number: part.number }),
      quantity: 1,
      action: 'replace',
    })),
    tools: document.tools.map((name, i) => ({ key: key('tool', i), name })),
    torques: document.torques.map((torque, i) => ({
      key: key('torque', i),
      name: torque.name,
      ...threads(torque.thread),
      condition: 'dry',
      nm: torque.nm,
      passes: torque.passes,
      count: torque.count,
      source: 'demo',
    })),
    sources: [{ key: 'demo', kind: 'demonstration', title: 'Generated values' }],
  });
  const steps = document.steps.map((title, i) => {
    const prose = [0, 1, 2].map((n) => SENTENCES[(seed * 3 + i * 5 + n * 7) % SENTENCES.length]).join(' ');
    const values = frontmatter.torques.filter((_, n) => document.torques[n]?.step === i + 1);
    const tightened = values.map((torque) => `Tighten to <Torque of="${torque.key}" />.`).join(' ');
    return { id: `step-${i + 1}`, title: title.slice(0, 90), cautions: [], body: `${prose} ${tightened}`.trim() };
  });
  return toSource({ frontmatter, intro: '', steps });
}

/**
 * Writes a content folder of `count` procedures: those of this release, which the demonstration tells its history
 * of, and generated ones under all other numbers, beside the engines and vocabulary of this release.
 */
export function writeBook(contentDir: string, folder: string, count: number): void {
  for (const part of ['procedures', 'engines', 'vocabulary', 'demonstration'])
    cpSync(join(contentDir, part), join(folder, part), { recursive: true });
  const procedures = join(folder, 'procedures');
  const shipped = new Set(readdirSync(procedures).map((file) => file.slice(0, 'p-0000'.length)));
  generatedDocuments(count).forEach((document, i) => {
    const name = document.number.toLowerCase();
    if (!shipped.has(name)) writeFileSync(join(procedures, `${name}-generated.mdx`), sourceOf(document, i));
  });
}
