import { type AstroGlobal } from 'astro';
import { PAGE_TAGS_HEADER } from './response-guard.ts';

/**
 * Lets the front server keep this page and serve the same bytes to everyone, until one of its tags moves.
 * @param tags what the page shows: `workshops`, `workshop:ID`, `build:ID`
 */
export function keepPublicPage(astro: AstroGlobal, tags: readonly string[]): void {
  astro.response.headers.set(PAGE_TAGS_HEADER, tags.join(','));
}
