/**
 * A part in view, half-open, in frames of the rate that goes with the list: [from, to). Kept small: the public
 * page carries the list as data.
 */
export interface Appearance {
  readonly partId: string;
  readonly from: number;
  readonly to: number;
}
