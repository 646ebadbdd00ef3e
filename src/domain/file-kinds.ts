/** What a file is, by its content. */
export const FILE_KINDS = ['photo', 'video', 'sound', 'document', 'text'] as const;

/** What a file was brought in for. */
export const FILE_PURPOSES = ['footage', 'episode', 'diary', 'plan'] as const;
export type FilePurpose = (typeof FILE_PURPOSES)[number];

/**
 * uploading: parts are being sent; checking: the worker looks at it; ready; failed: with a sentence why.
 */
export const FILE_STATES = ['uploading', 'checking', 'ready', 'failed'] as const;
