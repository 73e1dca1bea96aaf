import { readdir, readFile } from 'node:fs/promises';
import { basename, join } from 'node:path';
import { SYSTEMS } from '@/domain/procedure/systems';
import type { TemplateToChoose } from '@/domain/writing/templates';
import { parsedText } from '../book/parsed';
import { app } from '../context';

/** The bones of a procedure for one kind of work, from `content/templates`. */
export interface Template extends TemplateToChoose {
  /** Canonical text, markers and all. */
  source: string;
}

const held = new Map<string, Promise<Template[]>>();

async function load(contentDir: string): Promise<Template[]> {
  const folder = join(contentDir, 'templates');
  const names = await readdir(folder).catch((error: NodeJS.ErrnoException) => {
    if (error.code === 'ENOENT') return [];
    throw error;
  });
  const templates = await Promise.all(
    names
      .filter((name) => name.endsWith('.mdx'))
      .sort()
      .map(async (file): Promise<Template> => {
        const parsed = await parsedText(await readFile(join(folder, file), 'utf8'));
        if (!parsed.ok)
          throw new Error(`${file}, line ${parsed.errors[0]?.line ?? 1}: ${parsed.errors[0]?.message ?? ''}`);
        const { procedure, rendered, canonical } = parsed;
        const { title, system, cautions } = procedure.frontmatter;
        return {
          name: basename(file, '.mdx'),
          title,
          system,
          steps: procedure.steps.length,
          cautions: cautions.length,
          holds: rendered.steps.reduce((sum, step) => sum + step.holds.length, 0),
          source: canonical,
        };
      }),
  );
  const order = Object.keys(SYSTEMS);
  return templates.sort((a, b) => order.indexOf(a.system) - order.indexOf(b.system) || a.title.localeCompare(b.title));
}

/** The templates in the order of the systems. Read once: they change only with a release. */
export async function readTemplates(): Promise<Template[]> {
  const { contentDir } = (await app()).config;
  const known = held.get(contentDir) ?? load(contentDir);
  held.set(contentDir, known);
  known.catch(() => held.delete(contentDir));
  return known;
}
