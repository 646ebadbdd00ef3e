import { readSlateCode } from '../../../domain/footage/slate-code.ts';

/** Pixels as a canvas gives them: red, green, blue and alpha, a byte each, row by row. */
export interface Picture {
  readonly width: number;
  readonly height: number;
  readonly data: Uint8ClampedArray;
}

/** Gives the instant that a clock slate in a picture shows, in milliseconds since 1970; null where none reads. */
export type ReadSlatePicture = (picture: Picture) => number | null;

/** Loads what reads codes, which few visits to a clip need. */
export async function loadSlateReader(): Promise<ReadSlatePicture> {
  const { decodeQR } = await import('qr/decode.js');
  return (picture) => {
    let text: string;
    try {
      text = decodeQR(picture);
    } catch {
      // That is how it says that there is no code in the picture, or none that it can read.
      return null;
    }
    const read = readSlateCode(text);
    return read.ok ? read.value : null;
  };
}
