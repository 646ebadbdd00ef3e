import { Marked } from 'marked';
import sanitizeHtml from 'sanitize-html';

const marked = new Marked({ gfm: true, breaks: true, async: false });

/** Headings stand below those of the page, as lines of their own. */
const RULES: sanitizeHtml.IOptions = {
  allowedTags: ['p', 'br', 'strong', 'em', 'del', 'code', 'pre', 'blockquote', 'ul', 'ol', 'li', 'a', 'h4'],
  allowedAttributes: { a: ['href', 'rel'], ol: ['start'] },
  allowedSchemes: ['http', 'https', 'mailto'],
  // `//elsewhere.example` would take the scheme of the page.
  allowProtocolRelative: false,
  disallowedTagsMode: 'discard',
  transformTags: {
    a: (_name, { href = '' }) => ({ tagName: 'a', attribs: { href, rel: 'nofollow ugc' } }),
    ...Object.fromEntries(
      ['h1', 'h2', 'h3', 'h5', 'h6'].map((tag) => [tag, sanitizeHtml.simpleTransform('h4', {})]),
    ),
  },
  // Text in elements that go: what is written in a paragraph stays, what a script or a style says does not.
  nonTextTags: ['script', 'style', 'textarea', 'option', 'noscript', 'iframe', 'svg', 'math', 'title'],
};

/**
 * Renders the Markdown subset that people write in: paragraphs, emphasis, lists, quotes, code, links, one kind of
 * heading. HTML in it is not shown, images are left out, links carry `nofollow ugc`.
 * @returns HTML that is safe to put into a page
 */
export function renderMarkdown(text: string): string {
  return sanitizeHtml(marked.parse(text) as string, RULES).trim();
}
