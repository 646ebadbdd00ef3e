import { useState } from 'react';
import { keepSingleKeys, singleKeysAreOn } from '../../../../client/single-keys.ts';

/** Whether keys without Ctrl do anything, as this browser remembers it. */
export function useSingleKeys() {
  const [singles, setSingles] = useState(singleKeysAreOn);
  return {
    singles,
    setSingles: (on: boolean) => {
      setSingles(on);
      keepSingleKeys(on);
    },
  };
}
