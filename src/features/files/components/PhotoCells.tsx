import { Button } from '../../../components/Button.tsx';
import { paths } from '../../../paths.ts';
import { type FileItem } from '../file.ts';

type PhotoCellsProps = {
  readonly items: readonly FileItem[];
  readonly onDelete?: ((item: FileItem) => void) | undefined;
};

/** Photos in ruled cells, like a contact sheet. */
export function PhotoCells({ items, onDelete }: PhotoCellsProps) {
  return (
    <ul className="grid grid-cols-[repeat(auto-fill,minmax(9rem,1fr))] ps-px pt-px">
      {items.map((item) => (
        <li key={item.id} className="-ms-px -mt-px grid content-start border border-line bg-sheet">
          <a href={paths.media(item.id, 'large')} className="block bg-ground">
            <img
              src={paths.media(item.id, 'thumb')}
              width={160}
              height={120}
              alt={item.name}
              loading="lazy"
              className="aspect-4/3 h-auto w-full object-contain"
            />
          </a>
          <div className="grid gap-1 border-t border-line px-2 py-1.5">
            <p className="truncate text-sm" title={item.name}>
              {item.name}
            </p>
            <p className="font-mono text-xs text-ink-soft">
              {item.wallTime?.slice(0, 16).replace('T', ' ') ?? 'no camera time'}
            </p>
            {onDelete && (
              <Button
                size="small"
                variant="quiet"
                className="-ms-3 justify-self-start"
                onClick={() => {
                  onDelete(item);
                }}
                aria-label={`Delete ${item.name}`}
              >
                Delete
              </Button>
            )}
          </div>
        </li>
      ))}
    </ul>
  );
}
