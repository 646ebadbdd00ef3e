import { and, eq, inArray } from 'drizzle-orm';
import { type Database } from '../../../db/client.ts';
import { files, fileVariants } from '../../../db/schema/files.ts';
import { type Probe } from '../../files/probe.ts';

/** What the file of a clip says of it beyond its columns, and the pictures made of all of it. */
interface Said {
  /** The camera by the file's own tags; null when they name none. */
  readonly filmedWith: string | null;
  /** Whether its frames come at uneven times that were not read. */
  readonly frameTimesUnread: boolean;
  readonly strips: readonly {
    readonly variant: string;
    readonly width: number | null;
    readonly height: number | null;
  }[];
}

/** @param fileId null for a clip that stays at home, whose file says nothing */
export async function loadSaid(db: Database, fileId: string | null): Promise<Said> {
  if (fileId === null) return { filmedWith: null, frameTimesUnread: false, strips: [] };
  const [file] = await db.select({ probe: files.probe }).from(files).where(eq(files.id, fileId));
  const strips = await db
    .select({ variant: fileVariants.variant, width: fileVariants.width, height: fileVariants.height })
    .from(fileVariants)
    .where(and(eq(fileVariants.fileId, fileId), inArray(fileVariants.variant, ['filmstrip', 'waveform'])))
    .orderBy(fileVariants.variant);
  const { filmedWith = null, frameTimesUnread = false } = (file?.probe ?? {}) as Probe;
  return { filmedWith, frameTimesUnread, strips };
}
