import type { Figure } from '@/domain/procedure/schema';
import type { Drawing } from './desk';

/** The drawings of the book, each once, with the words of the sheet that shows it first. */
export function drawingsOf(figures: readonly Figure[]): Drawing[] {
  const byFile = new Map<string, Drawing>();
  for (const { file, alt, caption } of figures) if (!byFile.has(file)) byFile.set(file, { file, alt, caption });
  return [...byFile.values()].sort((a, b) => a.caption.localeCompare(b.caption, 'en'));
}
