import { type MediaFacts } from './probe-media.ts';

/** Above this a copy would be too heavy for a viewer's line, in bits a second. */
export const MOST_COPIED_BITS = 12_000_000;

const PLAYABLE_PIXELS = ['yuv420p', 'yuvj420p'];

/**
 * Whether the camera's own streams can be shown as they are: H.264, 8 bits, 4:2:0, not interlaced, with AAC or no
 * sound, at or under 12 Mbit/s.
 */
export function canCopyStreams({ video, audio, bitRate }: MediaFacts): boolean {
  return (
    video !== null &&
    video.codec === 'h264' &&
    PLAYABLE_PIXELS.includes(video.pixelFormat) &&
    !video.interlaced &&
    (audio === null || audio.codec === 'aac') &&
    bitRate <= MOST_COPIED_BITS
  );
}

/** The options that make the playable copy of a film: without metadata, chapters, data tracks; it starts at once. */
export function renditionArgs(facts: MediaFacts, output: string): readonly string[] {
  const streams = ['-map', '0:v:0', '-map', '0:a:0?', '-dn', '-sn'];
  return [...streams, ...(canCopyStreams(facts) ? COPY : transcodeArgs(facts)), ...BARE, '-f', 'mp4', output];
}

/** The options that make the playable copy of a sound. */
export function soundArgs({ audio }: MediaFacts, output: string): readonly string[] {
  const codec = audio?.codec === 'aac' ? ['-c:a', 'copy'] : ['-c:a', 'aac', '-b:a', '160k'];
  return ['-map', '0:a:0', '-vn', '-dn', '-sn', ...codec, ...BARE, '-f', 'ipod', output];
}

const BARE = [
  '-map_metadata',
  '-1',
  '-map_metadata:s',
  '-1',
  '-map_chapters',
  '-1',
  '-fflags',
  '+bitexact',
  '-write_tmcd',
  '0',
  '-movflags',
  '+faststart',
];

// Cameras write place and device into supplemental messages between the pictures too (H.264, annex D).
const COPY = ['-c', 'copy', '-bsf:v', 'filter_units=remove_types=6'];

function transcodeArgs({ video }: MediaFacts): string[] {
  const upright = video !== null && video.height > video.width;
  const [width, height] = upright ? [1080, 1920] : [1920, 1080];
  const fit = `scale=w='min(${String(width)},iw)':h='min(${String(height)},ih)':force_original_aspect_ratio=decrease:force_divisible_by=2`;
  return [
    '-vf',
    [...(video?.interlaced === true ? ['yadif'] : []), fit, 'format=yuv420p', 'setsar=1'].join(','),
    '-c:v',
    'libx264',
    '-preset',
    'veryfast',
    '-profile:v',
    'high',
    '-crf',
    '21',
    '-maxrate',
    '10M',
    '-bufsize',
    '20M',
    // A key frame every two seconds, so that seeking to a note is quick.
    '-force_key_frames',
    'expr:gte(t,n_forced*2)',
    // The pictures keep their own times: notes are counted by them.
    '-fps_mode',
    'passthrough',
    '-c:a',
    'aac',
    '-b:a',
    '160k',
    '-ac',
    '2',
  ];
}
