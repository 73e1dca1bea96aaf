import type { Actor } from '@/domain/people/may';
import { textOf } from '../http/form';
import { Refusal } from '../refusal';
import type { SignedIn } from './checkSignIn';
import { changePassword, saveProfile, signOutEverywhere } from './profile';

/** What a form of the profile page came to. */
export type ProfileOutcome =
  | { kind: 'saved'; what: 'profile' }
  /** Every other session has ended; this browser is given a new one for `session`. */
  | { kind: 'saved'; what: 'password'; session: SignedIn }
  | { kind: 'signed-out' }
  /** `errors` by field name, "form" for what belongs to none; `typed` is kept for the form. */
  | { kind: 'refused'; section: 'profile' | 'password'; errors: Record<string, string>; typed: ProfileTyped };

/** What stood in the fields of a refused form, to stand there again. */
export interface ProfileTyped {
  name?: string;
  units?: string;
  shortcuts?: string;
}

const REPEAT = 'Write the same new password twice.';

/** Acts on one of the forms of the profile page; its `section` says which. Other refusals than of a field are thrown. */
export async function actOnProfileForm(actor: Actor, form: FormData): Promise<ProfileOutcome> {
  const text = (name: string) => textOf(form, name);
  const section = text('section');
  if (section === 'sessions') {
    await signOutEverywhere(actor);
    return { kind: 'signed-out' };
  }
  const refused = (errors: Record<string, string>): ProfileOutcome => ({
    kind: 'refused',
    section: section === 'password' ? 'password' : 'profile',
    errors,
    typed: section === 'password' ? {} : { name: text('name'), units: text('units'), shortcuts: text('shortcuts') },
  });
  try {
    if (section !== 'password') {
      await saveProfile(actor, {
        name: text('name'),
        units: text('units'),
        // A form that came without the field leaves it as it is.
        ...(form.has('shortcuts') && { shortcuts: text('shortcuts') !== 'off' }),
      });
      return { kind: 'saved', what: 'profile' };
    }
    if (text('next') !== text('repeat')) return refused({ repeat: REPEAT });
    const session = await changePassword(actor, { current: text('current'), next: text('next') });
    return { kind: 'saved', what: 'password', session };
  } catch (error) {
    if (!(error instanceof Refusal) || ![422, 429].includes(error.status)) throw error;
    const errors = (error.errors ?? []).map(({ path, message }) => [path, message]);
    return refused(errors.length ? (Object.fromEntries(errors) as Record<string, string>) : { form: error.detail });
  }
}
