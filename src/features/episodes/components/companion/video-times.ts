import { linkAt } from '../../../../domain/video-addresses/read-video-address.ts';
import { paths } from '../../../../paths.ts';
import { type CompanionVideo } from '../../companion.ts';

/**
 * Where a time leads without a script: into the file kept here by a media fragment, or to the host's own address of
 * that second. A script on the page seeks instead.
 */
export function timeAddress({ kept, elsewhere }: CompanionVideo, seconds: number): string {
  if (kept !== null) return `${paths.media(kept.id, 'video')}#t=${String(seconds)}`;
  return elsewhere === null ? '' : linkAt(elsewhere, seconds);
}
