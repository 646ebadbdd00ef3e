import { importClips } from '../features/footage/server/import-clips.ts';
import { addSlate } from '../features/footage/server/add-slate.ts';
import { addStretch } from '../features/footage/server/add-stretch.ts';
import { ImportClipsInput } from '../features/footage/footage.ts';
import { type Context } from '../server/context.ts';

/** Two days of the shop, filmed by two cameras and a phone; the films stay at home. */
const CLIPS = `name,camera,filmed,length,rate,pace,stage,parts
C0036.MP4,Big camera,2026-11-02 13:58:40Z,6:12,25,,Drum and bearings,117
C0037.MP4,Big camera,2026-11-02 14:09:05Z,4:48,25,,Drum and bearings,117
C0038.MP4,Big camera,2026-11-02 14:20:43Z,9:31,25,,Drum and bearings,117
A012_0211.MOV,Small camera,2026-11-02 14:21:50Z,8:02,50,,Drum and bearings,117
TL_0007.MP4,Small camera,2026-11-02 14:48:10Z,0:52,25,1:30,Drum and bearings,117
IMG_2204.MOV,Phone,2026-11-02 15:31:20Z,0:41,29.97,,Drum and bearings,117 119
C0039.MP4,Big camera,2026-11-02 15:40:02Z,7:25,25,,Drum and bearings,117 119
C0041.MP4,Big camera,2026-11-24 14:02:11Z,3:56,25,,Mill,123
IMG_2219.MOV,Phone,2026-11-24 14:05:30Z,0:28,29.97,,Mill,123
C0042.MP4,Big camera,2026-11-24 14:12:33Z,8:20,25,,Mill,123
TL_0009.MP4,Small camera,2026-11-24 14:16:00Z,0:20,25,1:30,Mill,123
A012_0215.MOV,Small camera,2026-11-24 14:41:05Z,0:19,50,1/4,Mill,123
`;

/** The slate stands in the fiftieth frame of both. In three weeks the camera has fallen 17.7 s further behind. */
const SLATES = [
  ['C0036.MP4', '2026-11-02 13:58:54.4'],
  ['C0041.MP4', '2026-11-24 14:02:43.1'],
] as const;
const SLATE_FRAME = '0:02';

/** Names the demo's footage, reads its slates, and writes down an hour with the camera off. */
export async function seedFootage(owner: Context, build: string): Promise<void> {
  const { ids } = await importClips(owner, { build, ...ImportClipsInput.parse({ text: CLIPS }) });
  const names = CLIPS.split('\n').slice(1);
  for (const [name, shows] of SLATES) {
    const clip = ids[names.findIndex((line) => line.startsWith(name))];
    if (clip == null) throw new Error(`The demo has no clip ${name}.`);
    await addSlate(owner, { build, clip, moment: SLATE_FRAME, shows, readBy: 'hand' });
  }
  await addStretch(owner, {
    build,
    day: '2026-11-02',
    from: '15:00',
    until: '15:25',
    stage: null,
    text: 'Warmed the bearings and slid them on.',
  });
}
