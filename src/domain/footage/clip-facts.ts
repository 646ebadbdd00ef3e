/** What a camera means by the time in its file: when the clip began, or when it was closed. */
export const CREATION_MEANS = ['start', 'end'] as const;
export type CreationMeans = (typeof CREATION_MEANS)[number];

/** How the time on a filmed clock slate was read: from its code, or by a person. */
export const SLATE_READERS = ['code', 'hand'] as const;

/** What says that work went on while no clip was running. */
export const OFF_CAMERA_SIGNS = ['timer', 'mark', 'diary', 'suggestion'] as const;
export type OffCameraSign = (typeof OFF_CAMERA_SIGNS)[number];
