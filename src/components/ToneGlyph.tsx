export type Tone = 'info' | 'done' | 'caution' | 'error';

/** The sign that says the tone without its colour. */
export function ToneGlyph({ tone }: { readonly tone: Tone }) {
  return (
    <svg
      aria-hidden="true"
      width="20"
      height="20"
      viewBox="0 0 20 20"
      fill="none"
      stroke="currentColor"
      strokeWidth="1.5"
      className="shrink-0"
    >
      {tone === 'info' && <path d="M10 9v6M10 5.2v1.6M2.5 10a7.5 7.5 0 1 0 15 0a7.5 7.5 0 1 0-15 0" />}
      {tone === 'done' && <path d="M3 10.5l4.5 4.5L17 5" strokeWidth="2" />}
      {tone === 'caution' && <path d="M10 2.5L18.5 17.5H1.5ZM10 8v4.5M10 14v1.6" />}
      {tone === 'error' && <path d="M2.5 2.5h15v15h-15ZM6.5 6.5l7 7M13.5 6.5l-7 7" />}
    </svg>
  );
}
