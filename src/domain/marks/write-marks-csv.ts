import { writeCsv } from '../csv/write-csv.ts';
import { type Edit, rateOf } from '../edit/edit.ts';
import { clipMomentUnder } from '../place/clip-moment-under.ts';
import { formatTimecode } from '../time/timecode.ts';

/**
 * The marks of an edit as a list: the moment of the episode, the clip beneath it with the clip's own label, and the
 * words. Moments are in whole frames, the ones that have begun.
 */
export function writeMarksCsv(edit: Edit): string {
  const rows = edit.markers.map(({ record, name, colour }) => {
    const under = clipMomentUnder(edit, record, 'picture');
    const clipRate = edit.picture.find(({ clip }) => clip === under?.clip)?.clipRate ?? edit.rate;
    return [
      formatTimecode(Number(record.floor()), edit.rate, edit.drop),
      record.div(rateOf(edit.rate)).valueOf().toFixed(3),
      under?.clip ?? '',
      under === null ? '' : formatTimecode(Number(under.at.mul(rateOf(clipRate)).floor()), clipRate),
      name,
      colour?.toLowerCase() ?? '',
    ];
  });
  return writeCsv([['timecode', 'seconds', 'clip', 'clip timecode', 'text', 'colour'], ...rows]);
}
