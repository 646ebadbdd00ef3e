import Fraction from 'fraction.js';

/** The units that are read. */
export type LengthUnit = 'um' | 'mm' | 'cm' | 'm' | 'thou' | 'in' | 'ft';

/** The two systems that a size is shown in. */
export type LengthSystem = 'mm' | 'in';

/** 1 in = 25.4 mm exactly: International yard and pound agreement of 1959; NIST SP 811, appendix B. */
const INCH = new Fraction('25.4');

/** What each unit is in millimetres, exactly. */
export const MILLIMETRES: Readonly<Record<LengthUnit, Fraction>> = {
  um: new Fraction(1, 1000),
  mm: new Fraction(1),
  cm: new Fraction(10),
  m: new Fraction(1000),
  thou: INCH.div(1000),
  in: INCH,
  ft: INCH.mul(12),
};

/** A length as it was given. Plain data, so that it can be stored and sent. */
export interface Length {
  /** Millimetres as an exact decimal, such as 3.96875. */
  readonly mm: string;
  /** The unit it was given in; feet with inches count as ft. */
  readonly unit: LengthUnit;
  /** As typed, with its unit where one was typed. */
  readonly typed: string;
  /** Decimals that were typed; null for a fraction of an inch. Says how fine the size was meant. */
  readonly decimals: number | null;
}

/** The system in which a length was given: its form comes first wherever it is shown. */
export function systemOf(unit: LengthUnit): LengthSystem {
  return unit === 'thou' || unit === 'in' || unit === 'ft' ? 'in' : 'mm';
}

/** A length in millimetres, exactly. */
export function inMillimetres(length: Pick<Length, 'mm'>): Fraction {
  return new Fraction(length.mm);
}

/** A length in inches, exactly. */
export function inInches(length: Pick<Length, 'mm'>): Fraction {
  return inMillimetres(length).div(INCH);
}

/** How often the denominator of a shop fraction is typed: halves to 128ths of an inch, and tenths and hundredths. */
const DENOMINATORS: readonly number[] = [2, 4, 8, 16, 32, 64, 128, 10, 20, 100];

/** Whether a denominator is one that inches are divided by, so that the length is a finite decimal. */
export function dividesInches(denominator: number): boolean {
  return DENOMINATORS.includes(denominator);
}
