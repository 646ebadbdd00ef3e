import type Fraction from 'fraction.js';
import { type SettingName } from '../finding.ts';
import { type Dimension } from './units.ts';

/** A value with its unit; a thread has its name for a value. */
export interface ClaimedValue {
  readonly value: Fraction | string;
  readonly unit: string;
}

/** Words that were read as a value, and what kind of thing they tell. */
export interface Claim {
  /** Words from one up to, not including, another. */
  readonly from: number;
  readonly to: number;
  readonly kind: 'size' | 'setting' | 'rating';
  readonly values: readonly ClaimedValue[];
  readonly what?: SettingName;
  readonly text?: string;
  readonly dimension: Dimension | 'name';
  readonly rule: string;
  readonly sure: number;
}

/** How the maker of these captions measures. */
export interface Shop {
  readonly units: 'mm' | 'in';
  readonly mil: 'mm' | 'thou';
}
