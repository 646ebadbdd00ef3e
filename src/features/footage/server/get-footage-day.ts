import { and, asc, eq, isNull } from 'drizzle-orm';
import { stages } from '../../../db/schema/builds.ts';
import { workStretches } from '../../../db/schema/footage.ts';
import { findGaps } from '../../../domain/footage/find-gaps.ts';
import { dayIn } from '../../../domain/time/day-in.ts';
import { type WorkshopContext } from '../../../server/context.ts';
import { read } from '../../../server/verb.ts';
import { loadBuild } from '../../builds/server/load-build.ts';
import { type FootageDay, type ShownStretch } from '../day.ts';
import { presentClips } from './present-clips.ts';

interface Asked {
  readonly build: string;
  /** A day, `unknown` for clips of unknown time; the newest with anything when left out. */
  readonly day?: string | undefined;
  readonly camera?: string | undefined;
  readonly stage?: string | undefined;
}

/** One day of a build's footage, with the days that there are. */
export const getFootageDay = read(
  { may: 'workshop.see-bench' },
  async (context, asked: Asked): Promise<FootageDay> => {
    const { workshop } = context;
    const build = await loadBuild(context, asked.build);
    const all = await presentClips(context, build.id);
    const stretches = await loadStretches(context, build.id);
    const dayOf = (at: number) => dayIn(workshop.timeZone, new Date(at));
    const counts = new Map<string, number>(stretches.map(({ from }) => [dayOf(from), 0]));
    for (const { from } of all)
      if (from !== null) counts.set(dayOf(from), (counts.get(dayOf(from)) ?? 0) + 1);
    const days = [...counts].map(([day, clips]) => ({ day, clips })).sort((a, b) => (a.day < b.day ? 1 : -1));
    const unknown = all.filter(({ from }) => from === null).length;
    const day = asked.day === 'unknown' ? null : (asked.day ?? days[0]?.day ?? null);
    const ofDay = all.filter(({ from }) => (from === null ? day === null : dayOf(from) === day));
    return {
      days,
      day,
      unknown,
      total: all.length,
      gaps: findGaps(
        ofDay.flatMap(({ from, until }) => (from === null || until === null ? [] : [{ from, until }])),
      ),
      clips: ofDay.filter(
        ({ camera, stage }) =>
          (asked.camera === undefined || camera?.id === asked.camera) &&
          (asked.stage === undefined || stage?.id === asked.stage),
      ),
      stretches: stretches.filter(({ from }) => dayOf(from) === day),
      cameras: [
        ...new Map(all.flatMap(({ camera }) => (camera === null ? [] : [[camera.id, camera]]))).values(),
      ].sort((a, b) => a.name.localeCompare(b.name)),
      running: stretches.find(({ until }) => until === null) ?? null,
    };
  },
);

async function loadStretches({ db }: WorkshopContext, buildId: string): Promise<ShownStretch[]> {
  const rows = await db
    .select({ stretch: workStretches, stage: stages.name })
    .from(workStretches)
    .leftJoin(stages, eq(stages.id, workStretches.stageId))
    .where(and(eq(workStretches.buildId, buildId), isNull(workStretches.deletedAt)))
    .orderBy(asc(workStretches.fromAt));
  return rows.map(({ stretch: { id, version, fromAt, untilAt, sign, text }, stage }) => ({
    id,
    version,
    from: fromAt.getTime(),
    until: untilAt?.getTime() ?? null,
    sign,
    stage,
    text,
  }));
}
