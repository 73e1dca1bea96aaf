/** Markdown that a sheet does not use, and what to do instead. Everything not named anywhere is refused too. */
const SENTENCES: Readonly<Record<string, string>> = {
  heading: 'Headings are not used: each step has its title. Remove the # or the underline, or start a new step.',
  thematicBreak: 'A rule across the text is not used. Start a new step instead.',
  code: 'Blocks of code are not used. Write the text as a paragraph or a list.',
  html: 'HTML is not used. Write plain text with the components of the sheet.',
  image: 'Images are not placed in the text. Describe the drawing under figures and place it with <Figure of="…" />.',
  imageReference:
    'Images are not placed in the text. Describe the drawing under figures and place it with <Figure of="…" />.',
  definition: 'Link definitions are not used. Write the address where the link stands: [words](https://address).',
  linkReference: 'Write the address where the link stands: [words](https://address).',
  footnoteReference: 'Footnotes are not used. Say it in the step, or name a source in the front matter.',
  footnoteDefinition: 'Footnotes are not used. Say it in the step, or name a source in the front matter.',
  delete: 'Text that is struck through is not used. Remove the words; the history keeps them.',
  mdxFlowExpression: 'Curly brackets have no place in a sheet. Remove them, or write \\{ for the sign itself.',
  mdxTextExpression: 'Curly brackets have no place in a sheet. Remove them, or write \\{ for the sign itself.',
  yaml: 'The front matter stands once, at the very top.',
};

export const REFUSED_MARKDOWN = Object.keys(SENTENCES);

export const refusal = (type: string) =>
  SENTENCES[type] ?? 'This kind of text is not used in a sheet. Write it as a paragraph, a list or a table.';

const MODULE_LINE =
  /^(import\s+(.+\s+from\s+)?["']|import\s*[{*(]|export\s+(default|const|let|var|function|class|async|type)\b|export\s*[{*])/;

/** Whether a paragraph starts as a line of program that other MDX would run. */
export const isModuleLine = (text: string) => MODULE_LINE.test(text);
export const MODULE_REFUSAL = 'Imports and exports are not used: a sheet is text, not a program. Remove this line.';
