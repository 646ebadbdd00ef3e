/** Something to wait for until a test opens it. */
export function makeGate(): { readonly opened: Promise<void>; open(): void } {
  let resolveOpened: (() => void) | undefined;
  const opened = new Promise<void>((resolve) => {
    resolveOpened = resolve;
  });
  return { opened, open: () => resolveOpened?.() };
}
