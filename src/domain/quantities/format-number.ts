/**
 * A number for reading: to so many significant digits, in plain notation, without zeros at the end. The only place
 * where a computed number is rounded for show.
 */
export function formatNumber(value: number, digits = 5): string {
  if (!Number.isFinite(value)) throw new RangeError('A number that is shown is finite.');
  if (value === 0) return '0';
  const size = Math.floor(Math.log10(Math.abs(value)));
  const decimals = Math.min(100, Math.max(0, digits - 1 - size));
  const text = value.toFixed(decimals);
  const plain = text.includes('.') ? text.replace(/\.?0+$/, '') : text;
  return plain === '-0' ? '0' : plain;
}
