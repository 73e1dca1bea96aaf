/** A component as it stands in canonical body text. */
export interface Found {
  name: string;
  given: Partial<Record<string, string>>;
  inside: string;
}

/** Canonical components are regular: one space, double quotes, an attribute never runs over a line. */
const TAG = /<([A-Z][A-Za-z]*)((?: [a-z]+="[^"\n]*")*)( \/)?>/y;
const MARK = /[`\\<]/g;
const ENTITIES: Record<string, string> = { '&quot;': '"', '&amp;': '&', '&lt;': '<', '&gt;': '>' };

function attributes(text: string): Found['given'] {
  const given: Found['given'] = Object.create(null);
  for (const [, name = '', value = ''] of text.matchAll(/([a-z]+)="([^"]*)"/g))
    given[name] = value.replace(/&(?:quot|amp|lt|gt);/g, (entity) => ENTITIES[entity] ?? entity);
  return given;
}

/**
 * Where a code span ends that opens at a place; -1 where none does. Asked for rising places, it reads the text once,
 * however many backticks there are.
 */
function codeEnds(text: string): (at: number, length: number) => number {
  const runs = new Map<number, { starts: number[]; next: number }>();
  for (const { 0: run, index } of text.matchAll(/`+/g)) {
    const like = runs.get(run.length);
    if (like) like.starts.push(index);
    else runs.set(run.length, { starts: [index], next: 0 });
  }
  return (at, length) => {
    const like = runs.get(length);
    if (!like) return -1;
    while ((like.starts[like.next] ?? Infinity) <= at) like.next += 1;
    const start = like.starts[like.next];
    return start === undefined ? -1 : start + length;
  };
}

/**
 * Canonical body text with each component replaced by what `make` says; null leaves it as it stands. Read without a
 * parser, in time that grows with the length alone. A component that is shown as code, or escaped, puts no value before
 * anybody and is passed over.
 */
export function replaceComponents(body: string, make: (found: Found) => string | null): string {
  const codeEnd = codeEnds(body);
  let out = '';
  let done = 0;
  let holdsClose = true;
  for (MARK.lastIndex = 0; ;) {
    const at = MARK.exec(body)?.index;
    if (at === undefined) return out + body.slice(done);
    const mark = body.charAt(at);
    if (mark === '\\') {
      MARK.lastIndex = at + 2;
      continue;
    }
    if (mark === '`') {
      let length = 1;
      while (body.charAt(at + length) === '`') length += 1;
      const end = codeEnd(at, length);
      MARK.lastIndex = end === -1 ? at + length : end;
      continue;
    }
    TAG.lastIndex = at;
    const [tag, name = '', text = '', empty] = TAG.exec(body) ?? [];
    if (tag === undefined) continue;
    let end = at + tag.length;
    let inside = '';
    if (!empty) {
      const close = name === 'Hold' && holdsClose ? body.indexOf('</Hold>', end) : -1;
      if (close === -1) {
        holdsClose &&= name !== 'Hold';
        continue;
      }
      inside = body.slice(end, close);
      end = close + '</Hold>'.length;
    }
    const made = make({ name, given: attributes(text), inside });
    if (made !== null) {
      out += body.slice(done, at) + made;
      done = end;
    }
    MARK.lastIndex = end;
  }
}
