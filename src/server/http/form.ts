import { malformed } from '../refusal';

/** The fields of a form that a page sent. Refuses 400 a body that is no form. */
export async function readForm(request: Request): Promise<FormData> {
  try {
    return await request.formData();
  } catch {
    throw malformed('The form could not be read. Go back and send it again.');
  }
}

/** A browser sends every line end of a form as CRLF. */
export const lineEnds = (text: string): string => text.replace(/\r\n/g, '\n');

/** What stands in a text field; empty where the form has none of that name. */
export function textOf(form: FormData, name: string): string {
  const value = form.get(name);
  return typeof value === 'string' ? lineEnds(value) : '';
}

/** All text fields of a form by name; a file is none. */
export const textsOf = (form: FormData): Record<string, string> =>
  Object.fromEntries(
    [...form].flatMap(([name, value]) => (typeof value === 'string' ? [[name, lineEnds(value)]] : [])),
  );
