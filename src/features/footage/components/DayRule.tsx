import { useId } from 'react';
import { PopDot } from '../../../components/CentrePop.tsx';
import { NOTE_KINDS } from '../../../components/note-kind.ts';
import { TONE_TEXT } from '../../../components/rule/RuleMarks.tsx';
import { type DayRuleData, graduateDay } from './day-rule-data.ts';

const FACE = 42;
const LANE = 34;

/**
 * A day of the shop as a steel rule: notes above it, a lane a camera below it, and last the hours without a clip, hatched
 * where work went on. The page lists the same beside it, so it is for the eye and the pointer alone.
 */
export function DayRule(data: DayRuleData) {
  return (
    <div aria-hidden="true">
      <div className="hidden md:block">
        <Lying {...data} />
      </div>
      <div className="md:hidden">
        <Upright {...data} />
      </div>
    </div>
  );
}

function Hatch({ id }: { readonly id: string }) {
  return (
    <pattern id={id} width="6" height="6" patternUnits="userSpaceOnUse" patternTransform="rotate(-45)">
      <path d="M0 3H6" className="stroke-ink-soft" strokeWidth="1" />
    </pattern>
  );
}

function Lying(data: DayRuleData) {
  const { from, until, lanes, pops, gaps, hatchings } = data;
  const hatch = useId();
  const share = (at: number) => Math.round(((at - from) / (until - from)) * 100_000) / 1000;
  const x = (at: number) => `${String(share(at))}%`;
  const wide = (a: number, b: number) => `${String(Math.max(0.15, share(b) - share(a)))}%`;
  const hours = (until - from) / 3_600_000;
  return (
    <div className="grid">
      <svg width="100%" height="26" className="overflow-visible">
        {pops.map(({ id, at, kind, label, href }) => (
          <svg key={id} x={x(at)} overflow="visible" className={TONE_TEXT[NOTE_KINDS[kind].tone]}>
            <path d="M0 14V26" stroke="currentColor" />
            <a href={href} tabIndex={-1}>
              <g transform="translate(0 10)">
                <title>{`${NOTE_KINDS[kind].label}: ${label}`}</title>
                <PopDot tone={NOTE_KINDS[kind].tone} />
              </g>
            </a>
          </svg>
        ))}
      </svg>
      <div className="steel border border-steel-edge">
        <svg width="100%" height={FACE} className="block overflow-visible">
          {graduateDay(data).map(({ at, isHour, label }) => (
            <svg key={at} x={x(at)} overflow="visible">
              <path d={`M0 0V${isHour ? '18' : '9'}`} className="stroke-steel-mark" />
              {label !== null && at < until && (
                <text
                  x="5"
                  y="32"
                  className={`fill-steel-mark font-mono text-[12px] font-semibold ${hours > 12 && Number.parseInt(label, 10) % 2 === 1 ? 'hidden' : ''}`}
                >
                  {label}
                </text>
              )}
            </svg>
          ))}
        </svg>
      </div>
      {lanes.map(({ name, clips }) => (
        <svg key={name} width="100%" height={LANE} className="overflow-visible">
          <text x="0" y="13" className="fill-ink-soft text-[12px]">
            {name}
          </text>
          {clips.map((clip) => (
            <a key={clip.id} href={clip.href} tabIndex={-1}>
              <title>{clip.name}</title>
              <rect
                x={x(clip.from)}
                y="18"
                width={wide(clip.from, clip.until)}
                height="13"
                className="fill-dye stroke-dye hover:fill-brass"
                fillOpacity={clip.dashed ? 0.25 : 1}
                strokeDasharray={clip.dashed ? '4 2' : undefined}
              />
            </a>
          ))}
        </svg>
      ))}
      <svg width="100%" height={LANE} className="overflow-visible">
        <Hatch id={hatch} />
        <text x="0" y="13" className="fill-ink-soft text-[12px]">
          Nothing filmed
        </text>
        {gaps.map((gap) => (
          <rect
            key={gap.from}
            x={x(gap.from)}
            y="18"
            width={wide(gap.from, gap.until)}
            height="13"
            className="fill-none stroke-line-strong"
            strokeDasharray="2 3"
          />
        ))}
        {hatchings.map((work) => (
          <rect
            key={work.from}
            x={x(work.from)}
            y="18"
            width={wide(work.from, work.until)}
            height="13"
            fill={`url(#${hatch})`}
            className="stroke-ink-soft"
          >
            <title>{work.label}</title>
          </rect>
        ))}
      </svg>
    </div>
  );
}

const HOUR_HEIGHT = 76;
const RULE_WIDTH = 58;
const COLUMN = 30;

/** The same like a tape, for narrow screens. */
function Upright(data: DayRuleData) {
  const { from, until, lanes, pops, gaps, hatchings } = data;
  const hatch = useId();
  const height = ((until - from) / 3_600_000) * HOUR_HEIGHT;
  const y = (at: number) => Math.round(((at - from) / (until - from)) * height * 10) / 10 + 22;
  const tall = (a: number, b: number) => Math.max(2, y(b) - y(a));
  const column = (index: number) => RULE_WIDTH + 14 + index * COLUMN;
  return (
    <svg width="100%" height={height + 30} className="overflow-visible">
      <Hatch id={hatch} />
      <foreignObject x="0" y="22" width={RULE_WIDTH} height={height}>
        <div className="steel-upright h-full border border-steel-edge" />
      </foreignObject>
      {graduateDay(data).map(({ at, isHour, label }) => (
        <g key={at} transform={`translate(0 ${String(y(at))})`}>
          <path
            d={`M${String(RULE_WIDTH)} 0H${String(RULE_WIDTH - (isHour ? 16 : 8))}`}
            className="stroke-steel-mark"
          />
          {label !== null && at < until && (
            <text x="4" y="14" className="fill-steel-mark font-mono text-[12px] font-semibold">
              {label}
            </text>
          )}
        </g>
      ))}
      {lanes.map(({ name, clips }, index) => (
        <g key={name}>
          <text x={column(index) + 9} y="14" textAnchor="middle" className="fill-ink-soft text-[12px]">
            {index + 1}
          </text>
          {clips.map((clip) => (
            <a key={clip.id} href={clip.href} tabIndex={-1}>
              <title>{clip.name}</title>
              <rect
                x={column(index)}
                y={y(clip.from)}
                width="18"
                height={tall(clip.from, clip.until)}
                className="fill-dye stroke-dye"
                fillOpacity={clip.dashed ? 0.25 : 1}
                strokeDasharray={clip.dashed ? '4 2' : undefined}
              />
            </a>
          ))}
        </g>
      ))}
      {gaps.map((gap) => (
        <rect
          key={gap.from}
          x={column(lanes.length)}
          y={y(gap.from)}
          width="18"
          height={tall(gap.from, gap.until)}
          className="fill-none stroke-line-strong"
          strokeDasharray="2 3"
        />
      ))}
      {hatchings.map((work) => (
        <rect
          key={work.from}
          x={column(lanes.length)}
          y={y(work.from)}
          width="18"
          height={tall(work.from, work.until)}
          fill={`url(#${hatch})`}
          className="stroke-ink-soft"
        />
      ))}
      {pops.map(({ id, at, kind, label, href }) => (
        <a key={id} href={href} tabIndex={-1} className={TONE_TEXT[NOTE_KINDS[kind].tone]}>
          <g transform={`translate(${String(column(lanes.length + 1) + 8)} ${String(y(at))})`}>
            <title>{label}</title>
            <PopDot tone={NOTE_KINDS[kind].tone} />
          </g>
        </a>
      ))}
    </svg>
  );
}
