/** One piece of a mail, top to bottom. Texts are plain: nothing in them is read as markup. */
export type MailBlock =
  /** Running text; a line break in it is kept. */
  | { readonly kind: 'paragraph'; readonly text: string }
  /** What the reader is asked to do: the words of the button and the whole http(s) address. */
  | { readonly kind: 'action'; readonly label: string; readonly url: string }
  /** A way out or aside, without a button. */
  | { readonly kind: 'link'; readonly label: string; readonly url: string }
  /** Something to copy or type elsewhere, such as a sign-in code. */
  | { readonly kind: 'code'; readonly text: string }
  | { readonly kind: 'list'; readonly items: readonly string[] }
  /** The fine print: why this mail came, how long a link holds. */
  | { readonly kind: 'small'; readonly text: string };

/** What a mail says, before it is set as text and HTML. Features write these; the server renders and sends them. */
export type Mail = {
  readonly subject: string;
  /** The line that a mailbox shows beside the subject, where the first words would say less. */
  readonly preview?: string;
  readonly blocks: readonly MailBlock[];
};
