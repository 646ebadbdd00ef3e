// Sets the reader's units before anything is painted. The policy knows these bytes by their hash.
try {
  const kept = globalThis.localStorage.getItem('units');
  globalThis.document.documentElement.dataset.units = kept === 'mm' || kept === 'inch' ? kept : 'both';
} catch {
  globalThis.document.documentElement.dataset.units = 'both';
}
