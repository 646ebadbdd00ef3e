/**
 * The edit of the demo's fourth episode, from clips of its second camera day; the hydraulics were filmed on another
 * one, whose clip is known by its name alone. 2537 frames, as many as the film in src/seed/media.
 */
export const PRESS_EDIT = {
  episode: 4,
  name: 'press-4.edl',
  rate: '25',
  text: `TITLE: PRESS 4
FCM: NON-DROP FRAME

001  C0036    V     C        00:01:02:00 00:01:25:17 00:00:00:00 00:00:23:17
* FROM CLIP NAME: C0036.MP4

002  C0039    V     C        00:00:40:00 00:01:01:18 00:00:23:17 00:00:45:10
* FROM CLIP NAME: C0039.MP4

003  C0040    V     C        00:02:10:00 00:02:45:17 00:00:45:10 00:01:21:02
* FROM CLIP NAME: C0040.MP4

004  C0040    V     C        00:06:00:00 00:06:20:10 00:01:21:02 00:01:41:12
* FROM CLIP NAME: C0040.MP4
`,
} as const;
