/** How a part comes about. */
export const PART_KINDS = ['made', 'bought', 'salvaged'] as const;
export type PartKind = (typeof PART_KINDS)[number];

/** The longest part number, in characters. */
export const PART_NUMBER_LENGTH = 24;
