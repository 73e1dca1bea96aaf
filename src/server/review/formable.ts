import { readDraft } from '@/domain/writing/readDraft';
import { parsedText } from '../book/parsed';

/** A text as the form takes it: as it was typed, or in canonical form where only that fits the form. */
export async function formable(source: string): Promise<string> {
  if (readDraft(source)) return source;
  const parsed = await parsedText(source);
  return parsed.ok ? parsed.canonical : source;
}
