import { getCollection } from 'astro:content';
import type { EngineName } from '@/components/sheet/engineNames';

/** Every engine that `content/engines` describes, as a sheet names it. */
export const knownEngines = async (): Promise<EngineName[]> =>
  (await getCollection('engines')).map(({ id, data }) => ({ key: id, name: data.name, years: data.years }));
