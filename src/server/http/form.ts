import { malformed } from '../refusal';

/** The fields of a form that a page sent. Refuses 400 a body that is no form. */
export async function readForm(request: Request): Promise<FormData> {
  try {
    return await request.formData();
  } catch {
    throw malformed('The form could not be read. Go back and send it again.');
  }
}
