import type { ReactNode } from 'react';
import type { Me } from '@/domain/api/schemas/me';
import { ROLE_NAMES } from '@/domain/people/roleNames';
import { Button } from '@/components/ui/Button';
import { Field } from '@/components/ui/Field';
import { Notice } from '@/components/ui/Notice';
import { Select } from '@/components/ui/Select';

type SectionName = 'profile' | 'password' | 'sessions';
type Errors = Record<string, string>;

/** What stands beside each form after it was sent. */
export interface ProfileState {
  saved?: SectionName | undefined;
  refused?:
    { section: SectionName; errors: Errors; typed: { name?: string; units?: string; shortcuts?: string } } | undefined;
}

/** One form with what it is about on the left and its answer at its own button. */
function Section({
  name,
  title,
  about,
  button,
  saved,
  error,
  children,
}: {
  name: SectionName;
  title: string;
  about: ReactNode;
  button: string;
  saved?: string | false;
  error?: string | undefined;
  children?: ReactNode;
}) {
  return (
    <form
      method="post"
      action="/profile"
      className="grid gap-x-10 gap-y-4 px-4 py-7 sm:px-9 md:grid-cols-[18rem_minmax(0,28rem)]"
    >
      <div>
        <h2 className="text-lead">{title}</h2>
        <div className="mt-1 text-ink-2">{about}</div>
      </div>
      <div className="flex flex-col gap-4">
        <input type="hidden" name="section" value={name} />
        {children}
        {error && <Notice live="alert">{error}</Notice>}
        <div className="flex flex-wrap items-center gap-4">
          <Button type="submit" kind={name === 'profile' ? 'main' : 'plain'}>
            {button}
          </Button>
          {saved && (
            <p role="status" className="font-medium">
              {saved}
            </p>
          )}
        </div>
      </div>
    </form>
  );
}

/** Name, settings, password and sessions, each a form of its own that works without a script. */
export function ProfileForms({ me, saved, refused }: { me: Me } & ProfileState) {
  const errorsOf = (section: SectionName): Errors => (refused?.section === section ? refused.errors : {});
  const [profile, password] = [errorsOf('profile'), errorsOf('password')];
  return (
    <>
      <Section
        name="profile"
        title="You"
        about="Your name stands on the sheets you write and review."
        button="Save"
        saved={saved === 'profile' && 'Saved'}
        error={profile.form}
      >
        <Field
          label="Name"
          name="name"
          autoComplete="name"
          required
          maxLength={80}
          defaultValue={refused?.typed.name ?? me.name}
          error={profile.name}
        />
        <Select
          label="Units"
          name="units"
          defaultValue={refused?.typed.units ?? me.units}
          error={profile.units}
          options={[
            { value: 'metric', label: 'Metric: N·m, mm, kPa, °C' },
            { value: 'inch', label: 'Inch: lbf·ft, in, psi, °F' },
          ]}
        />
        <Select
          label="Single-key shortcuts"
          name="shortcuts"
          defaultValue={refused?.typed.shortcuts ?? (me.shortcuts ? 'on' : 'off')}
          hint="A slash goes to search; n and p go to the next and the previous change of a proposal. Off, no key acts alone."
          options={[
            { value: 'on', label: 'On' },
            { value: 'off', label: 'Off' },
          ]}
        />
        <dl className="grid grid-cols-[auto_1fr] gap-x-5 gap-y-1">
          <dt className="text-ink-2">E-mail</dt>
          <dd>{me.email}</dd>
          {me.roles.map((role) => (
            <div key={role.in + role.shopId + role.role} className="contents">
              <dt className="text-ink-2">{ROLE_NAMES[role.role]}</dt>
              <dd>{role.name}</dd>
            </div>
          ))}
        </dl>
      </Section>
      <Section
        name="password"
        title="Password"
        about="A new password signs you out everywhere else."
        button="Change password"
        saved={saved === 'password' && 'Password changed'}
        error={password.form}
      >
        {/* Password managers look for the account that a new password belongs to. */}
        <input type="hidden" autoComplete="username" value={me.email} readOnly />
        <Field
          label="Present password"
          name="current"
          type="password"
          autoComplete="current-password"
          required
          error={password.current}
        />
        <Field
          label="New password"
          name="next"
          type="password"
          autoComplete="new-password"
          required
          hint="10 characters or more. A few words are good."
          error={password.next}
        />
        <Field
          label="New password again"
          name="repeat"
          type="password"
          autoComplete="new-password"
          required
          error={password.repeat}
        />
      </Section>
      <Section
        name="sessions"
        title="Sign out everywhere"
        about="Ends every session you have, on this and on every other device."
        button="Sign out everywhere"
      />
    </>
  );
}
