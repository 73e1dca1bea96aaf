import { Button } from '@/components/ui/Button';
import { Field } from '@/components/ui/Field';
import { Notice } from '@/components/ui/Notice';

/** Somebody of the demonstration, to sign in as with one press. */
export interface DemonstrationPerson {
  email: string;
  password: string;
  name: string;
  role: string;
  at: string;
}

/** What both forms of the page send besides who it is. */
interface FormFacts {
  csrfToken: string;
  /** Path to go to afterwards. */
  to: string;
}

const Hidden = ({ csrfToken, to }: FormFacts) => (
  <>
    <input type="hidden" name="csrfToken" value={csrfToken} />
    <input type="hidden" name="callbackUrl" value={to} />
  </>
);

export function SignInForm({
  facts,
  typed,
  problem,
  notice,
}: {
  facts: FormFacts;
  /** The address that did not work, to be corrected. */
  typed: string;
  problem: string | null;
  notice: string | null;
}) {
  return (
    <form method="post" action="/api/auth/callback/credentials" className="flex flex-col gap-4">
      <Hidden {...facts} />
      {notice && <Notice live="status">{notice}</Notice>}
      <Field
        label="E-mail"
        name="email"
        type="email"
        autoComplete="username"
        inputMode="email"
        required
        defaultValue={typed}
        aria-invalid={problem ? true : undefined}
      />
      <Field
        label="Password"
        name="password"
        type="password"
        autoComplete="current-password"
        required
        error={problem ?? undefined}
      />
      <Button type="submit" kind="main" className="self-start px-8">
        Sign in
      </Button>
    </form>
  );
}

/** One form; each person is a button of it. */
export function SignInAs({ people, facts }: { people: readonly DemonstrationPerson[]; facts: FormFacts }) {
  const places = [...new Set(people.map(({ at }) => at))];
  return (
    <form method="post" action="/api/auth/callback/credentials">
      <Hidden {...facts} />
      <input type="hidden" name="password" value={people[0]?.password} />
      <div className="gap-x-8 md:columns-2">
        {places.map((place) => (
          <section key={place} aria-label={place} className="mb-5 break-inside-avoid">
            <h3 className="border-b-frame border-ink pb-1 font-sans text-small font-medium text-ink-2">{place}</h3>
            <ul>
              {people
                .filter(({ at }) => at === place)
                .map(({ email, name, role }) => (
                  <li key={email} className="border-b border-hair last:border-0">
                    <button
                      name="email"
                      value={email}
                      className="flex min-h-touch w-full items-center justify-between gap-4 text-left hover:bg-wash"
                    >
                      <span className="font-semibold">{name}</span>
                      <span className="text-ink-2">{role}</span>
                    </button>
                  </li>
                ))}
            </ul>
          </section>
        ))}
      </div>
    </form>
  );
}
