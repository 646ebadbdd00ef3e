/** A small file that came with a form. Its bytes are no property, so that nothing walks through them. */
export class UploadedFile {
  readonly #bytes: Uint8Array;

  constructor(
    /** As the person named it. */
    readonly name: string,
    bytes: Uint8Array,
  ) {
    this.#bytes = bytes;
  }

  get bytes(): Uint8Array {
    return this.#bytes;
  }
}
