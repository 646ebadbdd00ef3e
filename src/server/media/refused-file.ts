/** A file that is not taken, with the sentence that its owner reads: what is wrong, and what to do. */
export class RefusedFile extends Error {
  constructor(sentence: string) {
    super(sentence);
    this.name = 'RefusedFile';
  }
}
