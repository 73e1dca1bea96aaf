import { defineCollection } from 'astro:content';
import { z } from 'astro/zod';
import { glob } from 'astro/loaders';
import { Engine } from '@/domain/procedure/engine';
import { Frontmatter } from '@/domain/procedure/schema';
import { VocabularyFile } from '@/domain/search/vocabulary';

/**
 * What the repository ships. The build fails on a file that breaks its schema. Procedures are only
 * checked here: at first start they are read as text, parsed without evaluation and kept in the
 * database, which is the truth from then on.
 */

const procedures = defineCollection({
  loader: glob({ pattern: 'p-*.mdx', base: './content/procedures' }),
  schema: Frontmatter,
});

/** Bones of a new procedure for one kind of work; read as text when somebody starts from one. */
const templates = defineCollection({
  loader: glob({ pattern: '*.mdx', base: './content/templates' }),
  schema: Frontmatter,
});

const engines = defineCollection({
  loader: glob({ pattern: '*.yaml', base: './content/engines' }),
  schema: Engine,
});

const vocabulary = defineCollection({
  loader: glob({ pattern: '*.yaml', base: './content/vocabulary' }),
  schema: VocabularyFile,
});

const handbook = defineCollection({
  loader: glob({ pattern: '*.mdx', base: './content/handbook' }),
  schema: z
    .object({
      title: z.string().min(1).max(90),
      summary: z.string().min(1).max(300),
      /** Place in the list of pages, counted from 1. */
      order: z.number().int().min(1),
    })
    .strict(),
});

/** The words around each calculator. They stand in the worksheet's own folder, whose name is their id. */
const calculators = defineCollection({
  loader: glob({
    pattern: '*/docs.mdx',
    base: './src/domain/worksheets',
    generateId: ({ entry }) => entry.slice(0, entry.indexOf('/')),
  }),
  schema: z.object({}).strict(),
});

export const collections = { procedures, templates, engines, vocabulary, handbook, calculators };
