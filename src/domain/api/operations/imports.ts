import { operation } from '../operation';
import { ImportedSheet, ImportForm, ImportRequest } from '../schemas/imports';

export const importHowTo = operation({
  id: 'importHowTo',
  method: 'post',
  path: '/imports',
  area: 'Proposals',
  summary: 'Read a how-to, in Markdown or as .docx, and answer the draft it would make; stores nothing',
  description:
    'Send JSON with `markdown`, or a form with a `file`. Give `source` to `POST /procedures`, with `leftOut` under `origin`, to start the draft. 422 says why a document cannot be read.',
  body: ImportRequest,
  form: ImportForm,
  reply: ImportedSheet,
});
