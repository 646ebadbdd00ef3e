const UNITS = ['bytes', 'KiB', 'MiB', 'GiB', 'TiB'] as const;

/**
 * A size as people read it: three digits, in units of 1024 (IEC 80000-13), such as `1.21 GiB`.
 * @param bytes a whole number of bytes
 */
export function sayBytes(bytes: number): string {
  if (bytes === 1) return '1 byte';
  let value = bytes;
  let unit = 0;
  // 1023.5 would be said as 1024 of the smaller unit.
  while (value >= (unit === 0 ? 1024 : 999.5) && unit < UNITS.length - 1) {
    value /= 1024;
    unit += 1;
  }
  const digits = unit === 0 ? 0 : value < 9.995 ? 2 : value < 99.95 ? 1 : 0;
  return `${value.toFixed(digits)} ${UNITS[unit] ?? ''}`;
}
