import {
  AlignmentType,
  CommentRangeEnd,
  CommentRangeStart,
  CommentReference,
  DeletedTextRun,
  Document,
  ExternalHyperlink,
  FootnoteReferenceRun,
  Footer,
  Header,
  HeadingLevel,
  ImageRun,
  InsertedTextRun,
  LevelFormat,
  Math,
  MathRun,
  Packer,
  Paragraph,
  Table,
  TableCell,
  TableRow,
  Textbox,
  TextRun,
  type FileChild,
  type ParagraphChild,
} from 'docx';

/** Word processor documents for tests, written by a library that knows nothing of the one that reads them. */

const CHANGED = { author: 'Wren', date: '2026-01-02T03:04:05Z' };
const PIXEL = Buffer.from(
  'iVBORw0KGgoAAAANSUhEUgAAAAEAAAABCAYAAAAfFcSJAAAADUlEQVR42mNk+M9QDwADhgGAWjR9awAAAABJRU5ErkJggg==',
  'base64',
);

export const run = (text: string, look: { bold?: true; italics?: true; strike?: true; superScript?: true } = {}) =>
  new TextRun({ text, ...look });
export const inserted = (text: string) => new InsertedTextRun({ text, id: 1, ...CHANGED });
export const deleted = (text: string) => new DeletedTextRun({ text, id: 2, ...CHANGED });
export const link = (text: string, to: string) => new ExternalHyperlink({ link: to, children: [run(text)] });
export const picture = (description: string) =>
  new ImageRun({
    type: 'png',
    data: PIXEL,
    transformation: { width: 9, height: 9 },
    altText: { name: 'p', title: '', description },
  });
export const footnote = (id: number) => new FootnoteReferenceRun(id);
export const comment = (id: number, text: string): ParagraphChild[] => [
  new CommentRangeStart(id),
  run(text),
  new CommentRangeEnd(id),
  new TextRun({ children: [new CommentReference(id)] }),
];
export const formula = (text: string) => new Math({ children: [new MathRun(text)] });

const children = (of: string | ParagraphChild[]) => (typeof of === 'string' ? [run(of)] : of);
export const para = (of: string | ParagraphChild[]) => new Paragraph({ children: children(of) });
const LEVELS = [HeadingLevel.HEADING_1, HeadingLevel.HEADING_2, HeadingLevel.HEADING_3] as const;
export const heading = (level: 1 | 2 | 3, of: string | ParagraphChild[]) =>
  new Paragraph({ heading: LEVELS[level - 1]!, children: children(of) });
export const point = (of: string | ParagraphChild[], level = 0) =>
  new Paragraph({ numbering: { reference: 'numbers', level }, children: children(of) });
export const dot = (of: string | ParagraphChild[], level = 0) =>
  new Paragraph({ bullet: { level }, children: children(of) });
export const table = (rows: (string | string[])[][], { merged = false } = {}) =>
  new Table({
    rows: rows.map(
      (cells, i) =>
        new TableRow({
          children: cells.map(
            (cell) =>
              new TableCell({
                ...(merged && i === 0 ? { columnSpan: 2 } : {}),
                children: [cell].flat().map((text) => para(text)),
              }),
          ),
        }),
    ),
  });
export const textBox = (text: string) => new Textbox({ children: [para(text)], style: { width: '100pt' } });

export interface Extras {
  footnotes?: Record<number, string>;
  comments?: string[];
  head?: string;
  foot?: string;
}

/** The bytes of a .docx that holds these blocks. */
export async function docx(
  blocks: readonly FileChild[],
  { footnotes = {}, comments = [], head, foot }: Extras = {},
): Promise<Buffer> {
  const document = new Document({
    numbering: {
      config: [
        {
          reference: 'numbers',
          levels: [0, 1, 2].map((level) => ({
            level,
            format: LevelFormat.DECIMAL,
            text: `%${level + 1}.`,
            alignment: AlignmentType.LEFT,
          })),
        },
      ],
    },
    footnotes: Object.fromEntries(Object.entries(footnotes).map(([id, text]) => [id, { children: [para(text)] }])),
    comments: {
      children: comments.map((text, id) => ({
        id,
        author: 'Wren',
        initials: 'WC',
        date: new Date(0),
        children: [para(text)],
      })),
    },
    sections: [
      {
        headers: head === undefined ? {} : { default: new Header({ children: [para(head)] }) },
        footers: foot === undefined ? {} : { default: new Footer({ children: [para(foot)] }) },
        children: [...blocks],
      },
    ],
  });
  return Packer.toBuffer(document);
}
