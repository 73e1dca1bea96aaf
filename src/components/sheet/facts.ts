import { dayOf } from '@/components/ui/day';
import type { Sheet } from '@/domain/api/schemas/book';
import type { TitleBlockFacts } from './TitleBlock';
import { counted } from './words';

/** What the title block of a published sheet says. */
export function factsOf({ number, revision, current, earlier, withdrawn }: Sheet): TitleBlockFacts {
  const isCurrent = revision.letter === current.letter;
  return {
    number,
    letter: revision.letter,
    standing: withdrawn ? 'withdrawn' : isCurrent ? 'current' : 'superseded',
    published: dayOf(revision.publishedAt),
    writtenBy: revision.author.name,
    reviewedBy: revision.reviewers.map(({ name }) => name).join(', ') || 'Nobody named',
    sheetCheck: revision.sheetCheck,
    history: {
      href: `/procedures/${number}/revisions`,
      ...(isCurrent && { origins: `/procedures/${number}/origins` }),
      text: earlier > 0 ? counted(earlier, 'earlier revision') : isCurrent ? 'First revision' : 'Every revision',
    },
  };
}
