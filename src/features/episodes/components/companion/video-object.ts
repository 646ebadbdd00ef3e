import { formatIsoDuration } from '../../../../domain/time/format-iso-duration.ts';
import { paths } from '../../../../paths.ts';
import { type Companion } from '../../companion.ts';
import { describeEpisode } from './describe-episode.ts';

/**
 * What search engines are told of the video, as JSON-LD that may stand inside a script element.
 * Source: schema.org, VideoObject.
 * @param site PUBLIC_URL
 * @param page the page's whole address
 */
export function videoObject(companion: Companion, site: string, page: string): string {
  const { episode, video, build } = companion;
  const { kept, elsewhere } = video;
  const data = {
    '@context': 'https://schema.org',
    '@type': 'VideoObject',
    name: episode.title,
    description: describeEpisode(companion),
    url: page,
    uploadDate: episode.publishedOn ?? undefined,
    duration: video.seconds === null ? undefined : formatIsoDuration(video.seconds),
    contentUrl:
      kept === null
        ? elsewhere?.kind === 'file'
          ? elsewhere.address
          : undefined
        : site + paths.media(kept.id, 'video'),
    embedUrl: elsewhere?.frameUrl ?? undefined,
    thumbnailUrl: kept?.hasPoster === true ? site + paths.media(kept.id, 'poster') : undefined,
    isPartOf: { '@type': 'CreativeWorkSeries', name: build.name },
    position: episode.number,
  };
  return JSON.stringify(data).replaceAll('<', '\\u003c');
}
