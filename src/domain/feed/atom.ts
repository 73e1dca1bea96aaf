import { create } from 'xmlbuilder2';
import type { XMLBuilder } from 'xmlbuilder2/lib/interfaces';
import { xmlText } from '../export/xmlText';
import { summaryOf, titleOf, type FeedEvent } from './entry';

const ATOM = 'http://www.w3.org/2005/Atom';

export interface Feed {
  /** UUID that stays when the key is replaced. */
  id: string;
  title: string;
  /** ISO 8601: of the latest entry, or of the making of an empty feed. */
  updated: string;
  /** Scheme, host and port of the book. */
  origin: string;
  /** Absolute address of this page of the feed. */
  self: string;
  /** The page with the latest entries, and the one with the next older ones where there are any. */
  first: string;
  next: string | null;
  entries: readonly FeedEvent[];
}

// An Atom title or summary without a type is plain text (RFC 4287, 3.1.1): "bore < 81 mm" stays what it says.
const line = (parent: XMLBuilder, name: string, text: string) => parent.ele(ATOM, name).txt(xmlText(text)).up();

const link = (parent: XMLBuilder, rel: string, href: string, type?: string) =>
  parent.ele(ATOM, 'link', { rel, href, ...(type && { type }) }).up();

function person(parent: XMLBuilder, role: 'author' | 'contributor', name: string): void {
  line(parent.ele(ATOM, role), 'name', name);
}

function entry(parent: XMLBuilder, event: FeedEvent, origin: string): void {
  const node = parent.ele(ATOM, 'entry');
  line(node, 'id', `urn:uuid:${event.id}`);
  line(node, 'title', titleOf(event));
  line(node, 'updated', event.at);
  line(node, 'published', event.at);
  person(node, 'author', event.author);
  for (const name of event.reviewers) person(node, 'contributor', name);
  link(node, 'alternate', `${origin}/procedures/${event.number}/revisions/${event.letter}`, 'text/html');
  node.ele(ATOM, 'category', { term: event.kind }).up();
  node.ele(ATOM, 'category', { term: xmlText(event.book) }).up();
  line(node, 'summary', summaryOf(event));
}

/** An Atom feed document (RFC 4287), one page of a paged feed (RFC 5005, 3). */
export function atomFeed({ id, title, updated, origin, self, first, next, entries }: Feed): string {
  const feed = create({ version: '1.0', encoding: 'UTF-8' }).ele(ATOM, 'feed', { 'xml:lang': 'en' });
  line(feed, 'id', `urn:uuid:${id}`);
  line(feed, 'title', title);
  line(feed, 'updated', updated);
  line(feed, 'generator', 'Matchmark');
  link(feed, 'self', self, 'application/atom+xml');
  link(feed, 'first', first, 'application/atom+xml');
  if (next !== null) link(feed, 'next', next, 'application/atom+xml');
  link(feed, 'alternate', `${origin}/`, 'text/html');
  for (const event of entries) entry(feed, event, origin);
  return `${feed.doc().end({ prettyPrint: true })}\n`;
}
