import { z } from 'zod';
import { isOneLine, NOT_ONE_LINE } from '@/domain/procedure/characters';
import { appendAudit } from '../audit/append';
import { app } from '../context';
import { invalid, stale } from '../refusal';
import { assertGoodPassword, hashPassword } from './passwords';

const NewPerson = z.object({
  name: z
    .string()
    .trim()
    .min(1, 'Write a name.')
    .max(80, 'Use 80 characters or fewer.')
    .refine(isOneLine, NOT_ONE_LINE),
  email: z.string().trim().max(254).email('This is no e-mail address.'),
  password: z.string(),
});

/**
 * Makes the first steward of a network, who then looks after everybody else; returns the person's id.
 * For whoever runs the server, so there is no actor. Refuses 409 where a steward is there already.
 */
export async function createFirstSteward(input: { name: string; email: string; password: string }): Promise<string> {
  const read = NewPerson.safeParse(input);
  if (!read.success)
    throw invalid(
      'The steward was not made.',
      read.error.issues.map(({ path, message }) => ({ path: path.join('.'), message })),
    );
  const { name, email, password } = read.data;
  assertGoodPassword(password, 'password');
  const passwordHash = await hashPassword(password);
  const { db } = await app();
  return db.write(async () => {
    const { Person, Membership } = db.models;
    const [there] = await db.read<{ stewards: number; sameEmail: number }>(
      `SELECT (SELECT count(*) FROM memberships m JOIN people p ON p.id = m.personId
          WHERE m.role = 'steward' AND p.demonstration = 0) AS stewards,
        (SELECT count(*) FROM people WHERE email = :email) AS sameEmail`,
      { email },
    );
    if (there?.stewards) throw stale('This network has a steward already, who can add others.');
    if (there?.sameEmail) throw stale('Somebody has this e-mail address already.');
    const person = await Person.create({ name, email, passwordHash });
    await Membership.create({ personId: person.id, scope: 'network', role: 'steward' });
    await appendAudit({
      actorId: null,
      act: 'person.added',
      subject: { type: 'person', id: person.id },
      detail: { role: 'steward' },
    });
    return person.id;
  });
}
