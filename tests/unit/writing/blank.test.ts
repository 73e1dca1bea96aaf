import { expect, it } from 'vitest';
import { BLANK_PROCEDURE } from '@/domain/procedure/blank';
import { parseProcedure } from '@/domain/procedure/parse';
import { readDraft } from '@/domain/writing/readDraft';

it('is a text in order: canonical, without a notice, and fit for the form', () => {
  const parsed = parseProcedure(BLANK_PROCEDURE);
  expect(parsed).toMatchObject({ ok: true, notices: [] });
  expect(parsed.ok && parsed.canonical).toBe(BLANK_PROCEDURE);
  expect(readDraft(BLANK_PROCEDURE)).not.toBeNull();
});
