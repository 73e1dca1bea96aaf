import type { APIRoute } from 'astro';
import { version } from '../../../package.json';
import { openApiDocument } from '@/domain/api/openapi';

let document: string | undefined;

/** The API in the form that other programs read; says nothing of what the book holds, so it is open to all. */
export const GET: APIRoute = () => {
  document ??= JSON.stringify(openApiDocument(version));
  return new Response(document, {
    headers: { 'content-type': 'application/json', 'cache-control': 'public, max-age=300' },
  });
};
