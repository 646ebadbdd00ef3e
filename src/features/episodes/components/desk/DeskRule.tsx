import { memo, useEffect, useRef } from 'react';
import { SteelRule } from '../../../../components/SteelRule.tsx';
import { appearancesFromNotes } from '../../../../domain/appearances/appearances-from-notes.ts';
import { partsAt } from '../../../../domain/appearances/parts-at.ts';
import { frameToSeconds } from '../../../../domain/time/frames.ts';
import { hatchingsOf } from '../say-off-camera.ts';
import { type DeskData } from './desk-data.ts';
import { shown } from './desk-state.ts';
import { formatMoment, placeAt } from './moment.ts';
import { ruleLength } from './rule-length.ts';
import { useClock, useDesk, useDeskState } from './use-desk.ts';
import { useRuleSlider } from './use-rule-slider.ts';

/** The episode's time as a steel rule that seeks: by click, by drag, by tap, and by keys on its face. */
export const DeskRule = memo(function DeskRule() {
  const { data, clock, mark } = useDesk();
  const state = useDeskState();
  const place = useRef<HTMLDivElement>(null);
  const known = useClock(clock, (one) => one.length());
  const { rate } = clock;
  const seconds = (frame: number) => frameToSeconds(frame, rate);
  const notes = shown(state, 'note').map(({ id, form }) => ({
    ...form,
    id,
    ...placeAt(form.position, rate),
  }));
  const chapters = shown(state, 'chapter').map(({ form: { title, position } }) => ({
    title,
    ...placeAt(position, rate),
  }));
  const appearances = appearancesFromNotes({
    notes,
    byHand: shown(state, 'appearance').map(({ form: { partId, position } }) => {
      const { frame, endFrame } = placeAt(position, rate);
      return { partId, from: frame, to: endFrame ?? frame };
    }),
    rate,
    lengthFrames: known,
  });
  const length = ruleLength(known, [...notes, ...chapters], rate);
  const starts = chapters.map(({ frame }) => frame);
  const inView = useClock(clock, (one) =>
    partsAt(one.now(), appearances, starts)
      .filter(({ filled }) => filled)
      .map(({ partId }) => partId)
      .join(),
  );
  useRuleSlider(place, clock, length, (frame) => formatMoment(frame, rate));

  useEffect(() => {
    const press = (event: MouseEvent) => {
      const pop = event.target instanceof Element ? event.target.closest('[data-pop]') : null;
      if (pop) mark(pop.getAttribute('data-pop'));
    };
    const root = place.current;
    root?.addEventListener('click', press);
    return () => root?.removeEventListener('click', press);
  }, [mark]);

  return (
    <div ref={place}>
      <SteelRule
        length={seconds(length)}
        quiet
        now={0}
        balloons={balloonsOf(appearances, data, inView.split(','), seconds)}
        pops={notes.map(({ id, kind, text, frame }) => ({
          id,
          kind,
          at: seconds(Math.min(frame, length)),
          label: text.slice(0, 80),
          href: `#note-${id}`,
        }))}
        hatchings={hatchingsOf(data.offCamera, seconds(length))}
        chapters={chapters
          .filter(({ frame }) => frame < length)
          .map(({ title, frame }) => ({ at: seconds(frame), label: title }))}
      />
    </div>
  );
});

function balloonsOf(
  appearances: readonly { readonly partId: string; readonly from: number }[],
  { parts }: DeskData,
  inView: readonly string[],
  seconds: (frame: number) => number,
) {
  const byId = new Map(parts.map((part) => [part.id, part]));
  return appearances.flatMap(({ partId, from }, index) => {
    const part = byId.get(partId);
    // A part that stays while notes follow each other stands once, where it came into view.
    const before = appearances.slice(0, index).findLast((one) => one.partId === partId);
    if (!part || (before && seconds(from) - seconds(before.from) < 20)) return [];
    const { number: label, name, inPlans } = part;
    return {
      id: `${partId}-${String(index)}`,
      at: seconds(from),
      label,
      name,
      dashed: !inPlans,
      filled: inView.includes(partId),
    };
  });
}
