import { useSyncExternalStore } from 'react';

const never = () => () => undefined;

/** False in the server's HTML and until the browser has taken over, then true. */
export function useHydrated(): boolean {
  return useSyncExternalStore(
    never,
    () => true,
    () => false,
  );
}
