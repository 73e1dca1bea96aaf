import type { APIContext } from 'astro';
import { describe, expect, it } from 'vitest';
import { openApiDocument } from '@/domain/api/openapi';
import { METHODS } from '@/domain/api/operation';
import { OPERATIONS } from '@/domain/api/operations/all';
import type { Handler } from '@/server/http/endpoint';

const files = import.meta.glob<Record<string, unknown>>('../../../src/pages/api/v1/**/*.ts');

const pathOf = (file: string) =>
  file
    .replace(/^.*\/api\/v1/, '')
    .replace(/(\/index)?\.ts$/, '')
    .replace(/\[(\w+)\]/g, '{$1}');

async function routes(): Promise<string[]> {
  const found: string[] = [];
  for (const [file, load] of Object.entries(files)) {
    const path = pathOf(file);
    if (path.includes('...')) continue;
    const module = await load();
    for (const method of METHODS) if (module[method.toUpperCase()]) found.push(`${method} ${path}`);
  }
  return found.sort();
}

describe('the description of the API', () => {
  it('has an operation for every route, and a route for every operation', async () => {
    expect(OPERATIONS.map(({ method, path }) => `${method} ${path}`).sort()).toEqual(await routes());
    expect(new Set(OPERATIONS.map(({ id }) => id)).size).toBe(OPERATIONS.length);
  });

  it('stands on the very operation that the route validates with', async () => {
    for (const [file, load] of Object.entries(files)) {
      const module = await load();
      for (const method of METHODS) {
        const handler = module[method.toUpperCase()] as Handler | undefined;
        if (handler) expect(handler.operation).toMatchObject({ method, path: pathOf(file) });
      }
    }
  });

  it('answers every other method with 405', async () => {
    for (const [file, load] of Object.entries(files)) {
      if (file.includes('...')) continue;
      const all = (await load())['ALL'] as ((context: APIContext) => Promise<Response>) | undefined;
      const response = await all?.({ request: new Request('http://book.test', { method: 'PROPFIND' }) } as APIContext);
      expect({ file, status: response?.status }).toEqual({ file, status: 405 });
    }
  });
});

describe('the OpenAPI document', () => {
  const document = openApiDocument('0.0.0');
  const whole = JSON.stringify(document);

  it('resolves every reference within itself', () => {
    const references = [...whole.matchAll(/"\$ref":"#\/([^"]+)"/g)].map((match) => match[1]!);
    expect(references.length).toBeGreaterThan(50);
    for (const reference of new Set(references)) {
      let at: unknown = document;
      for (const part of reference.split('/')) at = (at as Record<string, unknown> | undefined)?.[part];
      expect(at, reference).toBeTypeOf('object');
    }
  });

  it('describes each path parameter, and 404 where there is one', () => {
    for (const [path, operations] of Object.entries(document.paths))
      for (const operation of Object.values(operations) as {
        parameters: { name: string; in: string }[];
        responses: object;
      }[]) {
        const named = operation.parameters.filter((p) => p.in === 'path').map((p) => p.name);
        expect(named).toEqual([...path.matchAll(/\{(\w+)\}/g)].map((match) => match[1]));
        if (named.length > 0) expect(operation.responses).toHaveProperty('404');
        expect(operation.responses).toHaveProperty('401');
      }
  });

  it('writes tuples as OpenAPI 3.1 does', () => {
    expect(document.openapi).toBe('3.1.0');
    expect(whole).toContain('"prefixItems":[{"type":"number"');
    expect(whole).not.toContain('"items":[');
  });
});
