/** The ways of leading to a second of a video elsewhere, by what they do. */
export const ADAPTER_IDS = ['player-messages', 'seconds-in-query', 'seconds-in-fragment'] as const;
export type AdapterId = (typeof ADAPTER_IDS)[number];

/** How one way of keeping videos is spoken to. Addresses have passed readVideoAddress before. */
export interface VideoAdapter {
  readonly id: AdapterId;
  /** The page answers player messages, so that its frame can be followed and sought. */
  readonly speaks: boolean;
  /** The address for someone to open, at a second. */
  readonly linkAt: (address: URL, seconds: number) => URL;
}
