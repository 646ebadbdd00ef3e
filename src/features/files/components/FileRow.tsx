import { Button } from '../../../components/Button.tsx';
import { joinClasses } from '../../../components/join-classes.ts';
import { Progress } from '../../../components/Progress.tsx';
import { sayBytes } from '../../../domain/byte-sizes.ts';
import { paths } from '../../../paths.ts';
import { type FileItem } from '../file.ts';
import { sayLength, sayRate } from './say-length.ts';

type FileRowProps = {
  readonly item: FileItem;
  /** Left out for those who may not. */
  readonly onDelete?: (() => void) | undefined;
};

/** A clip, a sound or a list: what it is, how long, how large; while it is looked at, how far that is. */
export function FileRow({ item, onDelete }: FileRowProps) {
  const strip = item.variants.find(({ variant }) => variant === 'filmstrip');
  const wave = item.variants.find(({ variant }) => variant === 'waveform');
  const thumb = item.variants.find(({ variant }) => variant === 'thumb');
  const playable = item.variants.find(({ variant }) => variant === 'video' || variant === 'sound');
  return (
    <li
      className={joinClasses(
        'grid gap-3 border-b border-line px-4 py-3 last:border-b-0',
        thumb ? 'md:grid-cols-[7.5rem_minmax(0,1fr)_auto]' : 'md:grid-cols-[minmax(0,1fr)_auto]',
      )}
    >
      {thumb && (
        <div className="hidden md:block">
          <img
            src={paths.media(item.id, 'thumb')}
            width={thumb.width ?? 120}
            height={thumb.height ?? 68}
            alt=""
            loading="lazy"
            className="h-17 w-30 border border-line object-cover"
          />
        </div>
      )}
      <div className="grid min-w-0 content-start gap-1">
        <p className="font-medium break-words">
          {playable ? (
            <a className="link" href={paths.media(item.id, playable.variant)}>
              {item.name}
            </a>
          ) : (
            item.name
          )}
        </p>
        <p className="flex flex-wrap gap-x-3 font-mono text-sm text-ink-soft">
          {describe(item).map((fact) => (
            <span key={fact}>{fact}</span>
          ))}
        </p>
        {item.state === 'checking' && <Checking item={item} />}
        {item.state === 'failed' && <p className="text-primer">{item.failure}</p>}
        {(strip ?? wave) && (
          <div className={joinClasses('mt-1 grid max-w-full gap-1', strip && 'w-fit')}>
            {strip && (
              <img
                src={paths.media(item.id, 'filmstrip')}
                width={strip.width ?? 0}
                height={strip.height ?? 0}
                alt={`${String(strip.frames ?? 0)} pictures of ${item.name}, at even times`}
                loading="lazy"
                className="h-auto max-h-14 w-auto max-w-full border-y-2 border-line-strong object-contain object-left"
              />
            )}
            {wave && (
              <img
                src={paths.media(item.id, 'waveform')}
                width={wave.width ?? 0}
                height={wave.height ?? 0}
                alt={`How loud ${item.name} is, from its beginning to its end`}
                loading="lazy"
                className="h-8 w-0 min-w-full"
              />
            )}
          </div>
        )}
      </div>
      {onDelete && item.state !== 'checking' && (
        <Button
          size="small"
          variant="danger"
          className="self-start justify-self-start"
          onClick={onDelete}
          aria-label={`Delete ${item.name}`}
        >
          Delete
        </Button>
      )}
    </li>
  );
}

function Checking({ item }: { readonly item: FileItem }) {
  if (item.progress === null) return <p className="text-sm text-ink-soft">Being looked at.</p>;
  return (
    <Progress
      label="Making the copy that is played"
      value={item.progress}
      detail={`${String(item.progress)} %`}
    />
  );
}

function describe(item: FileItem): string[] {
  const facts = [
    item.duration ? sayLength(item.duration) : null,
    item.duration ? sayRate(item.duration.rate) : null,
    item.width !== null && item.height !== null ? `${String(item.width)} × ${String(item.height)}` : null,
    sayBytes(item.bytes),
    item.wallTime === null ? null : `camera clock ${item.wallTime.slice(0, 16).replace('T', ' ')}`,
    item.state === 'ready' && !item.originalKept ? 'original let go' : null,
  ];
  return facts.filter((fact) => fact !== null);
}
