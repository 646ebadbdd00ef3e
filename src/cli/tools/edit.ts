import { z } from 'zod';
import { right, wrong } from '../../domain/answer.ts';
import { type Edit, sayWarning, type Segment } from '../../domain/edit/edit.ts';
import { readArguments } from '../read-arguments.ts';
import { editFields, readEditOf } from '../read-edit-request.ts';
import { readRequest } from '../read-request.ts';
import { type Tool } from '../tool.ts';

const USAGE = 'edit --fps 25 [--clip-fps NAME=RATE] list.edl|timeline.otio';

const EditRequest = z.object(editFields);

function presentSegment({ clip, source, record, speed }: Segment) {
  return {
    clip,
    source: [source.in.valueOf(), source.out.valueOf()],
    record: [record.in.valueOf(), record.out.valueOf()],
    speed: [Number(speed.s * speed.n), Number(speed.d)],
  };
}

/** Sound that is not simply that of the pictures. */
function ownSound({ picture, sound }: Edit): Segment[] {
  const key = ({ clip, source, record }: Segment) =>
    JSON.stringify([clip, source.in, record.in, record.out].map(String));
  const seen = new Set(picture.map(key));
  return sound.filter((segment) => !seen.has(key(segment)));
}

function presentEdit(edit: Edit) {
  const { rate, frames, picture, sound, warnings } = edit;
  const only = picture.length === 0;
  const own = only ? [] : ownSound(edit);
  return {
    rate: [rate.num, rate.den],
    frames: frames.valueOf(),
    segments: (only ? sound : picture).map(presentSegment),
    ...(own.length === 0 ? {} : { sound: own.map(presentSegment) }),
    warnings: [
      ...warnings.map(sayWarning),
      ...(only && sound.length > 0
        ? ['There is no picture in the edit: the segments are those of its sound.']
        : []),
    ],
  };
}

/** An edit list or timeline as segments, in frames from the clip's label 00:00:00:00 and from the first event. */
export const editTool: Tool = {
  usage: USAGE,
  fromArguments: (args, read) => {
    const known = { fps: { type: 'string' }, 'clip-fps': { type: 'string', multiple: true } } as const;
    const found = readArguments(args, known, USAGE);
    if (!found.ok) return found;
    const [path, ...more] = found.value.bare;
    if (path === undefined || more.length > 0)
      return wrong(`Give one edit list or timeline. Usage: ${USAGE}`);
    const text = read(path);
    return text.ok ? right({ ...found.value.options, edl: text.value }) : text;
  },
  run: (request) => {
    const asked = readRequest(EditRequest, request);
    if (!asked.ok) return asked;
    const edit = readEditOf(asked.value);
    return edit.ok ? right(presentEdit(edit.value)) : edit;
  },
};
