/** The lines of a procedure's text and where its front matter ends. */
export interface SourceLines {
  lines: string[];
  /** Number of lines up to and with the closing `---`; 0 where there is no front matter. */
  headLines: number;
}

const FENCE = /^---[ \t]*$/;

/** One line end for all, and no byte order mark, so that columns and hashes do not depend on the editor. */
export function plainLines(source: string): string {
  return source.replace(/^\ufeff/, '').replace(/\r\n?/g, '\n');
}

export function splitLines(text: string): SourceLines {
  const lines = text.split('\n');
  if (!FENCE.test(lines[0] ?? '')) return { lines, headLines: 0 };
  const end = lines.findIndex((line, i) => i > 0 && FENCE.test(line));
  return { lines, headLines: end < 0 ? 0 : end + 1 };
}

/**
 * The place in the form that a line of the text belongs to, as far as the bare lines tell; for
 * problems that stop the parser before there is a tree. `steps.3.body` counts from 0.
 */
export function pathOfLine({ lines, headLines }: SourceLines, line: number): string | undefined {
  if (line <= headLines) return undefined;
  const steps = lines.slice(headLines, line).filter((l) => /^\s*<Step[\s>]/.test(l)).length;
  return steps === 0 ? 'intro' : `steps.${steps - 1}.body`;
}
