/** Somebody who can be named in a message. */
export interface Named {
  id: string;
  name: string;
}

/** A run of a message; `person` where it names somebody. */
export interface MessageRun {
  text: string;
  person: Named | null;
}

const WORD = /[\p{L}\p{N}_]/u;

/** Cuts a message at the people that it names as `@Name`; a longer name wins over a shorter one, case is free. */
export function runsOf(text: string, people: readonly Named[]): MessageRun[] {
  const longest = [...people].sort((a, b) => b.name.length - a.name.length);
  const runs: MessageRun[] = [];
  let plain = '';
  for (let i = 0; i < text.length;) {
    const free = text[i] === '@' && !WORD.test(text[i - 1] ?? '');
    const found = free
      ? longest.find(({ name }) => {
          const end = i + 1 + name.length;
          return (
            name !== '' && text.slice(i + 1, end).toLowerCase() === name.toLowerCase() && !WORD.test(text[end] ?? '')
          );
        })
      : undefined;
    if (!found) {
      plain += text[i] ?? '';
      i += 1;
      continue;
    }
    if (plain) runs.push({ text: plain, person: null });
    plain = '';
    runs.push({ text: text.slice(i, i + 1 + found.name.length), person: found });
    i += 1 + found.name.length;
  }
  if (plain) runs.push({ text: plain, person: null });
  return runs;
}

/** Who is named in a message, each once, in the order they are. */
export const mentionsIn = (text: string, people: readonly Named[]): Named[] => [
  ...new Map(
    runsOf(text, people).flatMap(({ person }) => (person ? [[person.id, { id: person.id, name: person.name }]] : [])),
  ).values(),
];

/** The beginning of a name that is being typed before the caret: "@Ott" gives "Ott". Null where none is. */
export function nameBeingTyped(text: string, caret: number): string | null {
  const found = /(^|[^\p{L}\p{N}_])@([\p{L}\p{N}_.'’-]*(?: [\p{L}\p{N}_.'’-]*)?)$/u.exec(text.slice(0, caret));
  return found?.[2] ?? null;
}

/** People whose name, or a later part of it, begins with what was typed. */
export const completions = <P extends Named>(typed: string, people: readonly P[], most = 6): P[] => {
  const wanted = typed.toLowerCase();
  const begins = ({ name }: P) =>
    [name, ...name.split(' ').slice(1)].some((part) => part.toLowerCase().startsWith(wanted));
  return people.filter((person) => begins(person) && person.name.toLowerCase() !== wanted).slice(0, most);
};
