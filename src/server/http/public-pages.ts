import { type PageCache } from './page-cache.ts';
import { type PageChanges } from './change-counter.ts';
import { makePageForm, type PageForm } from './page-forms.ts';
import { type PageEncoding } from './page-negotiation.ts';
import { type CapturedAnswer } from './page-render.ts';
import { type HeaderPair } from './security-headers.ts';

/** What became of a request for a public page. */
export type PublicAnswer =
  | { readonly kind: 'page'; form(encoding: PageEncoding): Promise<PageForm> | PageForm }
  /** A redirect, an error, or a page that is not for keeping: sent as it came. */
  | { readonly kind: 'other'; readonly answer: CapturedAnswer };

type Outcome = PublicAnswer & { readonly tags: readonly string[] | null };

type Rendering = { readonly startedAt: number; readonly outcome: Promise<Outcome> };

export type PublicPagesOptions = {
  readonly cache: PageCache;
  readonly changes: PageChanges;
  readonly everyAnswer: readonly HeaderPair[];
  renderPage(path: string, requestId: string): Promise<CapturedAnswer>;
};

function hasCookie({ headers }: CapturedAnswer): boolean {
  return headers.some(([name]) => name.toLowerCase() === 'set-cookie');
}

/** Whether an answer is a page for everyone, the same until one of its tags moves. */
function isKeepable(answer: CapturedAnswer): boolean {
  const encoded = answer.headers.some(([name]) => name.toLowerCase() === 'content-encoding');
  return answer.status === 200 && answer.tags !== null && !hasCookie(answer) && !encoded;
}

/** Makes the function that answers for public pages: rendered once a change, one render a path at a time. */
export function createPublicPages({ cache, changes, everyAnswer, renderPage }: PublicPagesOptions) {
  const running = new Map<string, Rendering>();

  async function renderAndKeep(path: string, requestId: string, startedAt: number): Promise<Outcome> {
    const answer = await renderPage(path, requestId);
    const { tags } = answer;
    if (!isKeepable(answer) || tags === null) return { kind: 'other', answer, tags };
    const forms = new Map<PageEncoding, Promise<PageForm>>();
    const form = (encoding: PageEncoding) => {
      const made = forms.get(encoding) ?? makePageForm(answer, encoding, everyAnswer);
      forms.set(encoding, made);
      return made;
    };
    if (mayKeep(tags, startedAt)) {
      const [identity, gzip, br] = await Promise.all([form('identity'), form('gzip'), form('br')]);
      // Asked again: compressing took time, and a change may have been heard meanwhile.
      if (mayKeep(tags, startedAt)) cache.keep(path, { identity, gzip, br }, tags);
    }
    return { kind: 'page', form, tags };
  }

  function mayKeep(tags: readonly string[], startedAt: number): boolean {
    return changes.live && !changes.movedSince(tags, startedAt);
  }

  function start(path: string, requestId: string): Promise<Outcome> {
    const startedAt = changes.counter();
    const outcome = renderAndKeep(path, requestId, startedAt).finally(() => running.delete(path));
    running.set(path, { startedAt, outcome });
    return outcome;
  }

  /** Whether a request that came at `arrivedAt` may take an outcome whose render began before it. */
  function suits({ startedAt }: Rendering, outcome: Outcome, arrivedAt: number): boolean {
    if (outcome.kind === 'other' && hasCookie(outcome.answer)) return false;
    if (arrivedAt <= startedAt) return true;
    return outcome.tags !== null && !changes.movedSince(outcome.tags, startedAt);
  }

  /**
   * Answers a request for a public page that is not in the cache.
   * @throws what the render throws, to everyone who waited for it
   */
  return async function answerPublicPage(path: string, requestId: string): Promise<PublicAnswer> {
    const arrivedAt = changes.counter();
    for (;;) {
      const kept = cache.get(path);
      if (kept !== undefined) return { kind: 'page', form: (encoding) => kept[encoding] };
      const rendering = running.get(path);
      if (rendering === undefined) return start(path, requestId);
      const outcome = await rendering.outcome;
      if (suits(rendering, outcome, arrivedAt)) return outcome;
    }
  };
}
