import { type SelectOption } from './Select.tsx';

/** The options that hold every word typed, those whose label starts with the text first. */
export function matchOptions(options: readonly SelectOption[], text: string): readonly SelectOption[] {
  const words = text.toLowerCase().split(/\s+/).filter(Boolean);
  if (words.length === 0) return options;
  const start = words.join(' ');
  const matching = options.filter((option) => {
    const whole = `${option.label} ${option.detail ?? ''}`.toLowerCase();
    return words.every((word) => whole.includes(word));
  });
  const first = (option: SelectOption) => (option.label.toLowerCase().startsWith(start) ? 0 : 1);
  return matching.toSorted((a, b) => first(a) - first(b));
}
