import { readFileSync } from 'node:fs';
import { RelaxNGValidator, XmlDocument, XmlElement, type XmlNode } from 'libxml2-wasm';

const RNG = new URL('../fixtures/atom/rfc4287.rng', import.meta.url);
export const NS = { a: 'http://www.w3.org/2005/Atom' };

/** A feed as another XML reader sees it, held against the schema of RFC 4287. Throws where it is not valid. */
export function readAtom(text: string): XmlDocument {
  const doc = XmlDocument.fromString(text);
  const schema = XmlDocument.fromBuffer(readFileSync(RNG));
  const validator = RelaxNGValidator.fromDoc(schema);
  try {
    validator.validate(doc);
  } finally {
    validator.dispose();
    schema.dispose();
  }
  return doc;
}

export const elements = (from: XmlDocument | XmlNode, path: string): XmlElement[] =>
  (from instanceof XmlDocument ? from : (from as XmlElement))
    .find(path, NS)
    .filter((node) => node instanceof XmlElement);

export const texts = (from: XmlDocument | XmlNode, path: string): string[] =>
  elements(from, path).map(({ content }) => content);

/** Values of an attribute. */
export const given = (from: XmlDocument | XmlNode, path: string, name: string): string[] =>
  elements(from, path).flatMap((element) => element.attr(name)?.content ?? []);
