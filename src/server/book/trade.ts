import { readdir, readFile } from 'node:fs/promises';
import { basename, extname, join } from 'node:path';
import { parse } from 'yaml';
import type { z } from 'zod';
import { Engine } from '@/domain/procedure/engine';
import type { SearchEngine } from '@/domain/search/engine';
import { VocabularyFile, type VocabularyGroup } from '@/domain/search/vocabulary';
import { app } from '../context';

/** What the release says of the trade: its engines and the names it has for things. */
export interface Trade {
  engines: SearchEngine[];
  vocabulary: VocabularyGroup[];
}

async function readFolder<T>(folder: string, schema: z.ZodType<T, z.ZodTypeDef, unknown>): Promise<[string, T][]> {
  const names = await readdir(folder).catch((error: NodeJS.ErrnoException) => {
    if (error.code === 'ENOENT') return [];
    throw error;
  });
  return Promise.all(
    names
      .filter((name) => extname(name) === '.yaml')
      .sort()
      .map(async (name) => {
        const read = schema.safeParse(parse(await readFile(join(folder, name), 'utf8')));
        if (!read.success) throw new Error(`${name}: ${read.error.message}`);
        return [basename(name, '.yaml'), read.data];
      }),
  );
}

const held = new Map<string, Promise<Trade>>();

async function load(contentDir: string): Promise<Trade> {
  const [engines, files] = await Promise.all([
    readFolder(join(contentDir, 'engines'), Engine),
    readFolder(join(contentDir, 'vocabulary'), VocabularyFile),
  ]);
  return {
    engines: engines.map(([key, { name, aliases }]) => ({ key, name, aliases })),
    vocabulary: files.flatMap(([, { groups }]) => groups),
  };
}

/** Read once: it changes only with a release. */
export async function readTrade(): Promise<Trade> {
  const { contentDir } = (await app()).config;
  const known = held.get(contentDir) ?? load(contentDir);
  held.set(contentDir, known);
  known.catch(() => held.delete(contentDir));
  return known;
}
