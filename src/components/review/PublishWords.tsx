import type { Proposal } from '@/domain/api/schemas/proposals';

/** What publishing does, said before it is done. */
export function PublishWords({ proposal, letter, me }: { proposal: Proposal; letter: string; me: string }) {
  const { base, book, number } = proposal;
  const where = book.kind === 'common' ? 'in every shop' : `in ${book.name}`;
  const agreed = proposal.agreed.some((a) => a.person.id === me && a.stands);
  return (
    <p className="max-w-prose">
      {number} revision {letter} becomes the sheet to work from at once, {where}.{' '}
      {base !== null && `${base} stays in the history and says that it is superseded. `}
      {!agreed && 'Publishing is your agreement too. '}A published text cannot be changed, only followed by another.
    </p>
  );
}
