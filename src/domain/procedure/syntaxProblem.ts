import { problem, START, type Place } from './problems';
import { pathOfLine, type SourceLines } from './source';
import type { SourceProblem } from './types';

/** What unified throws where a tag or a brace cannot be read (a VFileMessage), as far as it is used here. */
interface Thrown {
  ruleId?: string;
  source?: string;
  reason?: string;
  place?: Place | { start: Place; end: Place };
}

const SENTENCES: readonly { when: (t: Thrown) => boolean; say: (t: Thrown) => string }[] = [
  {
    when: (t) => t.source === 'micromark-extension-mdx-expression' || /expression/.test(t.reason ?? ''),
    say: () => 'Curly brackets have no place in a sheet. Remove them, or write \\{ for the sign itself.',
  },
  {
    when: (t) => t.ruleId === 'unexpected-closing-slash',
    say: () => 'A component is closed here that was not opened.',
  },
  {
    when: (t) => t.ruleId === 'end-tag-mismatch' && /^Unexpected closing tag/.test(t.reason ?? ''),
    say: (t) => {
      const [closed, open] = [...(t.reason ?? '').matchAll(/`<\/?([^>`]*)>`/g)].map((m) => m[1]);
      return `Here ${closed || 'a nameless component'} is closed, but ${open || 'another component'} is still open.`;
    },
  },
  {
    when: (t) => t.ruleId === 'end-tag-mismatch' && /`<\//.test(t.reason ?? ''),
    say: (t) => {
      const name = /`<\/([^>`]*)>`/.exec(t.reason ?? '')?.[1] || 'the component';
      return `Here ${name} is closed among words. Put </${name}> on a line of its own.`;
    },
  },
  {
    when: (t) => t.ruleId === 'end-tag-mismatch',
    say: (t) => {
      const name = /`<([^>`]*)>`/.exec(t.reason ?? '')?.[1] || 'Step';
      return `<${name}> is opened and not closed. Put <${name}> and </${name}> on lines of their own, or both on one line.`;
    },
  },
  {
    when: (t) => /before name|start a (tag )?name|expected a character that can start a name/.test(t.reason ?? ''),
    say: (t) =>
      /`!`/.test(t.reason ?? '')
        ? 'Comments and HTML are not kept in a sheet. Remove this one.'
        : 'The sign < opens a component. Write \\< where you mean "less than", and [words](https://address) for a link.',
  },
  {
    when: (t) => t.ruleId === 'unexpected-attribute' || t.ruleId === 'unexpected-self-closing-slash',
    say: () => 'A closing tag holds its name and nothing else, for example </Step>.',
  },
  {
    when: (t) => t.ruleId === 'unexpected-lazy',
    say: () => 'A component is broken over the edge of a list or quotation. Write it on one line.',
  },
  {
    when: (t) => /attribute/.test(t.reason ?? ''),
    say: () => 'An attribute is written name="value", in straight double quotes, for example of="cover-bolt".',
  },
  {
    when: (t) => t.ruleId === 'unexpected-eof' || t.ruleId === 'unexpected-character',
    say: () => 'This component is not written as it should be. Compare it with <Torque of="cover-bolt" />.',
  },
];

/** Where the reader should look: at the tag that was opened, which the parser names only in its words. */
function placeOf({ reason = '', place }: Thrown): Place | undefined {
  const opened = /^Expected a closing tag for `[^`]*` \((\d+):(\d+)/.exec(reason);
  if (opened) return { line: Number(opened[1]), column: Number(opened[2]) };
  return place && 'start' in place ? place.start : place;
}

/** A thrown syntax error as a sentence at its place; anything else is thrown on. */
export function syntaxProblem(thrown: unknown, source: SourceLines): SourceProblem {
  if (thrown instanceof RangeError)
    return problem(START, 'The text is nested too deeply to be read. Write it flatter.');
  // The parser's own assertions, which only its development build checks, fire where tags and underlines cross.
  if (thrown instanceof Error && thrown.name === 'Assertion')
    return problem(
      START,
      'Components and other signs cross each other. Put every <Step> and </Step> on a line of its own.',
    );
  if (!(thrown instanceof Error) || !('ruleId' in thrown)) throw thrown;
  const message = thrown as Thrown;
  const place = placeOf(message);
  const say = SENTENCES.find(({ when }) => when(message))?.say ?? (() => 'The text cannot be read from here on.');
  return problem(place, say(message), place && pathOfLine(source, place.line));
}
