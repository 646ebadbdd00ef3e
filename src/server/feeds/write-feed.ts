import { getRssString } from '@astrojs/rss';

/** What every reader of the feed is told of one thing that came out. */
export interface FeedItem {
  /** Of the thing itself: it stays whatever becomes of title, address and contents. */
  readonly id: string;
  readonly title: string;
  /** A whole address. */
  readonly link: string;
  readonly publishedAt: Date;
  /** As HTML; the writer of it has escaped what people typed. */
  readonly html: string;
  readonly enclosure: { readonly url: string; readonly length: number; readonly type: string } | null;
}

export interface Feed {
  readonly title: string;
  readonly description: string;
  readonly link: string;
  /** The feed's own whole address. */
  readonly self: string;
  /** BCP 47. */
  readonly language: string;
  readonly items: readonly FeedItem[];
}

/** How long a reader may go without asking again, in minutes. Asking costs next to nothing here. */
const MINUTES_TO_LIVE = 60;

/** What XML 1.0 has no way to write (W3C XML 1.0, 2.2, Char), lone surrogates among it. */
const NOT_IN_XML = /[^\t\n\r\u{20}-\u{D7FF}\u{E000}-\u{FFFD}\u{10000}-\u{10FFFF}]/gu;

const clean = (text: string) => text.replace(NOT_IN_XML, '');

const escapeXml = (text: string) =>
  clean(text)
    .replaceAll('&', '&amp;')
    .replaceAll('<', '&lt;')
    .replaceAll('>', '&gt;')
    .replaceAll('"', '&quot;');

/** A feed as RSS 2.0, with its own address as an Atom link. Sources: RSS 2.0 of the RSS Advisory Board; RFC 4287. */
export function writeFeed({ title, description, link, self, language, items }: Feed): Promise<string> {
  return getRssString({
    title: clean(title),
    description: clean(description),
    site: link,
    trailingSlash: false,
    xmlns: { atom: 'http://www.w3.org/2005/Atom' },
    customData: [
      `<language>${escapeXml(language)}</language>`,
      `<ttl>${String(MINUTES_TO_LIVE)}</ttl>`,
      `<atom:link href="${escapeXml(self)}" rel="self" type="application/rss+xml"/>`,
    ].join(''),
    items: items.map((item) => ({
      title: clean(item.title),
      link: item.link,
      description: clean(item.html),
      pubDate: item.publishedAt,
      customData: `<guid isPermaLink="false">urn:uuid:${escapeXml(item.id)}</guid>`,
      ...(item.enclosure && { enclosure: item.enclosure }),
    })),
  });
}
