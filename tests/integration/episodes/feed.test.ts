import { XMLParser, XMLValidator } from 'fast-xml-parser';
import { beforeAll, describe, expect, it } from 'vitest';
import { bringInEpisodes } from '../../../src/features/episodes/server/bring-in-episodes.ts';
import { changeEpisode } from '../../../src/features/episodes/server/change-episode.ts';
import { getDesk } from '../../../src/features/episodes/server/get-desk.ts';
import { getFeed } from '../../../src/features/episodes/server/get-feed.ts';
import { feedInstant } from '../../../src/features/episodes/server/present-feed-item.ts';
import { getBuild } from '../../../src/features/builds/server/get-build.ts';
import { writeFeed } from '../../../src/server/feeds/write-feed.ts';
import { aKeptVideo, aShownBuild, aShownEpisode, BUILD, noteAt } from '../../support/companion.ts';
import { aWorkshop, type TestWorkshop } from '../../support/people.ts';
import { PUBLIC_URL, testServices } from '../../support/services.ts';

const HOSTILE = `</title><script>alert("1")</script> & ]]> 'it'`;

interface Item {
  title: string;
  link: string;
  guid: { '#text': string; '@_isPermaLink': string };
  pubDate: string;
  description: string;
  enclosure?: { '@_url': string; '@_length': string; '@_type': string };
}
interface Channel {
  title: string;
  link: string;
  language: string;
  ttl: string;
  'atom:link': { '@_href': string; '@_rel': string };
  item: Item[];
}

const services = await testServices();
let workshop: TestWorkshop;
let kept: string;
let fileId: string;

beforeAll(async () => {
  workshop = await aWorkshop(services);
  const parts = await aShownBuild(workshop.owner);
  const build = await getBuild(workshop.owner, { build: BUILD });
  await bringInEpisodes(workshop.owner, {
    build: BUILD,
    episodes: [
      { title: 'The frame', number: 1, address: 'https://video.example/1', publishedOn: '2020-02-29' },
    ],
  });
  fileId = await aKeptVideo(workshop.owner, build.id, { seconds: 60 });
  kept = await aShownEpisode(workshop.owner, parts, { fileId }, HOSTILE);
  await noteAt(workshop.owner, kept, 5, { text: `Mind <b>this</b> & that: ${HOSTILE}` });
});

async function readFeed(input: { build?: string } = {}): Promise<Channel> {
  const { feed } = await getFeed(workshop.anyone, input);
  const xml = await writeFeed(feed);
  expect(XMLValidator.validate(xml)).toBe(true);
  const parser = new XMLParser({
    ignoreAttributes: false,
    parseTagValue: false,
    isArray: (name: string) => name === 'item',
  });
  const { rss } = parser.parse(xml) as { rss: { '@_version': string; channel: Channel } };
  expect(rss['@_version']).toBe('2.0');
  return rss.channel;
}

describe('a feed', () => {
  it('tells the newest first, and what came out long ago with its true day', async () => {
    const { item } = await readFeed();
    expect(item.map(({ title }) => title)).toEqual([HOSTILE, 'The frame']);
    expect(item[1]?.pubDate).toBe('Sat, 29 Feb 2020 12:00:00 GMT');
  });

  it('names each by an id that is no address and stays when number and title change', async () => {
    const before = (await readFeed()).item[0];
    expect(before?.guid).toEqual({ '#text': `urn:uuid:${kept}`, '@_isPermaLink': 'false' });
    const { episode } = await getDesk(workshop.owner, { build: BUILD, episode: kept });
    const { title, about, version } = episode;
    await changeEpisode(workshop.owner, { build: BUILD, episode: kept, title, about, version, number: 9 });
    const after = (await readFeed()).item[0];
    expect(after?.guid).toEqual(before?.guid);
    expect(after?.link).toBe(`${PUBLIC_URL}/w/${workshop.slug}/${BUILD}/episodes/9`);
  });

  it('brings what people typed as text, never as markup', async () => {
    const html = (await readFeed()).item[0]?.description ?? '';
    expect(html).not.toMatch(/<script|<b>/);
    expect(html).toContain('Mind &lt;b&gt;this&lt;/b&gt; &amp; that');
    expect(html).toMatch(/<a href="[^"]+\?t=5">0:05<\/a>/);
    expect(html).toContain('ISO 4413');
  });

  it('encloses a file kept here with its length, and nothing for a video elsewhere', async () => {
    const [here, elsewhere] = (await readFeed()).item;
    const url = `${PUBLIC_URL}/media/${fileId}/video`;
    expect(here?.enclosure).toEqual({ '@_url': url, '@_length': '4321', '@_type': 'video/mp4' });
    expect(elsewhere?.enclosure).toBeUndefined();
  });

  it('says where it is, in what language, and for how long', async () => {
    const channel = await readFeed({ build: BUILD });
    const self = `${PUBLIC_URL}/w/${workshop.slug}/${BUILD}/feed.xml`;
    expect(channel['atom:link']).toMatchObject({ '@_href': self, '@_rel': 'self' });
    expect(channel).toMatchObject({
      language: 'en',
      ttl: '60',
      link: `${PUBLIC_URL}/w/${workshop.slug}/${BUILD}`,
    });
  });
});

describe('the day of a feed item', () => {
  const published = new Date('2026-11-12T08:30:00Z');

  it('is noon of its day', () => {
    expect(feedInstant('2026-11-01', published)).toEqual(new Date('2026-11-01T12:00:00Z'));
  });

  it('is never still to come', () => {
    expect(feedInstant('2026-11-12', published)).toEqual(published);
    expect(feedInstant(null, published)).toEqual(published);
  });
});
