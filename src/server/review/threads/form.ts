import { StartThread, WriteMessage } from '@/domain/api/schemas/threads';
import type { Actor } from '@/domain/people/may';
import { textOf } from '../../http/form';
import { asRefusal, malformed } from '../../refusal';
import { acceptSuggestion } from './accept';
import { startThread } from './start';
import { reopenThread, resolveThread, writeMessage } from './turn';

/** What a form of a thread came to, where no script ran. Where it was refused, all that was typed comes back. */
export type ThreadOutcome =
  | { kind: 'done'; thread: string }
  | {
      kind: 'refused';
      status: number;
      /** Null for a thread that was to be started. */
      thread: string | null;
      field: string | null;
      detail: string;
      typed: Record<'kind' | 'at' | 'text' | 'quote' | 'replacement' | 'value' | 'field', string>;
    };

export const isThreadForm = (form: FormData) => textOf(form, 'act').startsWith('thread-');

async function act(actor: Actor, proposalId: string, of: (name: string) => string): Promise<string> {
  const version = Number(of('version'));
  const thread = of('thread');
  switch (of('act')) {
    case 'thread-start': {
      const at = of('field') ? `${of('anchor')}.${of('field')}` : of('anchor');
      const step = at.startsWith('step:');
      const wanted = StartThread.parse({
        kind: of('kind'),
        anchor: at || null,
        text: of('text'),
        ...(step ? { quote: of('quote'), replacement: of('replacement') } : { value: of('value') }),
      });
      return (await startThread(actor, proposalId, wanted, version)).id;
    }
    case 'thread-reply':
      return (await writeMessage(actor, thread, WriteMessage.parse({ text: of('text') }).text)).id;
    case 'thread-resolve':
      return (await resolveThread(actor, thread, version)).id;
    case 'thread-reopen':
      return (await reopenThread(actor, thread, version)).id;
    case 'thread-accept':
      await acceptSuggestion(actor, thread, version);
      return thread;
    default:
      throw malformed('The form came without some of its fields. Go back and send it again.');
  }
}

/** The first fault of a form as the API tells it. */
const issueOf = (error: unknown) =>
  error instanceof Error && error.name === 'ZodError' && 'issues' in error
    ? (error.issues as { path: (string | number)[]; message: string }[])[0]
    : undefined;

/** Does what a form of a thread asks for. Refusals that can be put right come back as words; others are thrown. */
export async function actOnThreadForm(actor: Actor, proposalId: string, form: FormData): Promise<ThreadOutcome> {
  const of = (name: string) => textOf(form, name);
  if (!/^\d{1,9}$/.test(of('version')))
    throw malformed('The form came without some of its fields. Go back and send it again.');
  try {
    return { kind: 'done', thread: await act(actor, proposalId, of) };
  } catch (error) {
    const issue = issueOf(error);
    const { status, detail, errors } = issue
      ? { status: 422, detail: issue.message, errors: [{ path: String(issue.path[0] ?? ''), message: issue.message }] }
      : asRefusal(error);
    if (![403, 409, 422].includes(status)) throw error;
    const typed = ['kind', 'text', 'quote', 'replacement', 'value', 'field'].map((name) => [name, of(name)]);
    return {
      kind: 'refused',
      status,
      thread: of('thread') || null,
      field: errors?.[0]?.path ?? null,
      detail: errors?.[0]?.message ?? detail,
      typed: { ...Object.fromEntries(typed), at: of('anchor') } as Extract<ThreadOutcome, { kind: 'refused' }>['typed'],
    };
  }
}
