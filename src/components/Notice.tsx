import { type ReactNode } from 'react';
import { joinClasses } from './join-classes.ts';
import { type Tone, ToneGlyph } from './ToneGlyph.tsx';

type NoticeProps = {
  readonly tone?: Tone | undefined;
  readonly title?: string | undefined;
  /** What can be done about it, at the end of the line. */
  readonly action?: ReactNode;
  /** Read out when it appears: for what follows from something the person just did. */
  readonly live?: boolean | undefined;
  readonly children?: ReactNode;
};

const LOOKS: Record<Tone, { box: string; sign: string }> = {
  info: { box: 'border-dye bg-dye-wash', sign: 'text-dye' },
  done: { box: 'border-verdigris bg-verdigris-wash', sign: 'text-verdigris' },
  caution: { box: 'border-primer bg-primer-wash', sign: 'text-primer' },
  error: { box: 'border-primer bg-primer-wash', sign: 'text-primer' },
};

/** A line across the page that says something about all of it. */
export function Notice({ tone = 'info', title, action, live = false, children }: NoticeProps) {
  const look = LOOKS[tone];
  return (
    <div
      {...(live && { role: tone === 'error' || tone === 'caution' ? 'alert' : 'status' })}
      className={joinClasses(
        'flex flex-wrap items-center gap-x-4 gap-y-2 border px-4 py-3 text-ink',
        look.box,
      )}
    >
      <div className="flex min-w-0 flex-1 basis-64 gap-3">
        <span className={joinClasses('pt-0.5', look.sign)}>
          <ToneGlyph tone={tone} />
        </span>
        <div className="min-w-0">
          {title !== undefined && (
            <strong className={joinClasses('pe-2 font-bold', look.sign)}>{title}</strong>
          )}
          {children}
        </div>
      </div>
      {action != null && <div className="flex flex-wrap gap-2">{action}</div>}
    </div>
  );
}
