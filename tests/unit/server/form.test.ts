import { expect, it } from 'vitest';
import { textOf, textsOf } from '@/server/http/form';

it('reads the text fields of a form, with line ends as everywhere else', () => {
  const form = new FormData();
  form.append('reason', 'Two bolts broke.\r\nBoth at the rear.');
  form.append('empty', '');
  form.append('file', new File(['x'], 'x.txt'));
  expect(textOf(form, 'reason')).toBe('Two bolts broke.\nBoth at the rear.');
  expect([textOf(form, 'empty'), textOf(form, 'missing'), textOf(form, 'file')]).toEqual(['', '', '']);
  expect(textsOf(form)).toEqual({ reason: 'Two bolts broke.\nBoth at the rear.', empty: '' });
});
