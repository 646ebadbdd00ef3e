export type MediaFormat = 'mov' | 'matroska' | 'wav' | 'mp3';

/** The decoders that cameras and editors make use of; nothing else of the hundreds there are is ever started. */
const DECODERS = [
  'h264',
  'hevc',
  'prores',
  'dnxhd',
  'mjpeg',
  'mpeg4',
  'mpeg2video',
  'vp8',
  'vp9',
  'libdav1d',
  'av1',
  'aac',
  'mp3',
  'mp3float',
  'opus',
  'libopus',
  'vorbis',
  'flac',
  'alac',
  'ac3',
  'eac3',
  'pcm_s16le',
  'pcm_s16be',
  'pcm_s24le',
  'pcm_s24be',
  'pcm_s32le',
  'pcm_s32be',
  'pcm_f32le',
  'pcm_f32be',
  'pcm_u8',
  'pcm_alaw',
  'pcm_mulaw',
];

/** For every run of ffmpeg and ffprobe: local files alone, whatever a file asks for. */
export const READ_ONLY_LOCAL: readonly string[] = [
  '-protocol_whitelist',
  'file',
  '-codec_whitelist',
  DECODERS.join(','),
];

/** The one demuxer that a sniffed format is read by; it is forced, so that a disguise is not followed. */
const DEMUXERS: Readonly<Record<MediaFormat, { readonly name: string; readonly list: string }>> = {
  mov: { name: 'mov', list: 'mov,mp4,m4a,3gp,3g2,mj2' },
  matroska: { name: 'matroska', list: 'matroska,webm' },
  wav: { name: 'wav', list: 'wav' },
  mp3: { name: 'mp3', list: 'mp3' },
};

/** The options before an input of a sniffed format. */
export function inputArgs(format: MediaFormat): readonly string[] {
  const { name, list } = DEMUXERS[format];
  return ['-format_whitelist', list, '-f', name];
}
