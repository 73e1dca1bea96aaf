import { expect, type APIResponse, type Page } from '@playwright/test';
import type { ProcedureSummary, Sheet } from '@/domain/api/schemas/book';
import type { Proposal } from '@/domain/api/schemas/proposals';

/** Calls the API as the person whose browser the page is in. `path` begins after `/api/v1`. */
export const call = (
  page: Page,
  method: 'GET' | 'POST' | 'PUT' | 'PATCH' | 'DELETE',
  path: string,
  data?: unknown,
  headers: Record<string, string> = {},
): Promise<APIResponse> =>
  page.request.fetch(`/api/v1${path}`, { method, headers, ...(data === undefined ? {} : { data }) });

async function answered<T>(answer: APIResponse): Promise<T> {
  expect(answer.ok(), `${answer.url()}: ${await answer.text()}`).toBe(true);
  return (await answer.json()) as T;
}

export const readSheet = async (page: Page, number: string): Promise<Sheet> =>
  answered(await call(page, 'GET', `/procedures/${number}`));

export const readProposal = async (page: Page, id: string): Promise<Proposal> =>
  answered(await call(page, 'GET', `/proposals/${id}`));

/** A draft of a change to the sheet as it stands now, made by the person of the page. */
export async function draft(
  page: Page,
  number: string,
  change: (source: string) => string,
  reason: string,
): Promise<Proposal> {
  const sheet = await readSheet(page, number);
  const source = change(sheet.source);
  expect(source, 'the change changes something').not.toBe(sheet.source);
  return answered(
    await call(page, 'POST', `/procedures/${number}/proposals`, { base: sheet.revision.letter, source, reason }),
  );
}

/** The same, sent in for review. */
export async function propose(...given: Parameters<typeof draft>): Promise<Proposal> {
  const [page] = given;
  const { id } = await draft(...given);
  return answered(await call(page, 'POST', `/proposals/${id}/submit`));
}

/** The number of the procedure with that title, in the books that the person of the page may read. */
export async function numberOf(page: Page, title: string): Promise<string> {
  const { items } = await answered<{ items: ProcedureSummary[] }>(await call(page, 'GET', '/procedures?limit=200'));
  const found = items.find((item) => item.title === title);
  expect(found, `a sheet called ${title}`).toBeDefined();
  return found!.number;
}
