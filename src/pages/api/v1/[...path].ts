import type { APIRoute } from 'astro';
import { problemResponse } from '@/server/http/problem';
import { notFound } from '@/server/refusal';

/** Every address under `/api/v1` that is none. */
export const ALL: APIRoute = () => problemResponse(notFound(), crypto.randomUUID());
