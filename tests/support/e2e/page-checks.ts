import { type Page } from '@playwright/test';
import axe from 'axe-core';
import { HtmlValidate, StaticConfigLoader } from 'html-validate';

const TAGS = ['wcag2a', 'wcag2aa', 'wcag21aa', 'wcag22aa', 'best-practice'];

/** All that another colour scheme can change: the rest is the same page. */
const COLOUR_RULES = ['color-contrast', 'link-in-text-block'];

const validator = new HtmlValidate(
  new StaticConfigLoader({
    root: true,
    extends: ['html-validate:recommended', 'html-validate:a11y'],
    elements: ['html5'],
    rules: {
      // How React and Astro write what HTML allows to be written in several ways.
      'attr-case': 'off',
      'attribute-boolean-style': 'off',
      'attribute-empty-style': 'off',
      'doctype-style': 'off',
      'no-trailing-whitespace': 'off',
      'void-style': 'off',
      // React makes ids with characters that HTML allows and old stylesheets did not.
      'valid-id': ['error', { relaxed: true }],
      // Two submit buttons may share a name: the one that is pressed is sent.
      'form-dup-name': ['error', { shared: ['radio', 'checkbox', 'button', 'submit'] }],
      // Titles hold the names that people give to workshops and builds.
      'long-title': 'off',
      'no-inline-style': 'error',
    },
  }),
);

/** What is wrong with the HTML of a page as the server sent it. */
export async function validateHtml(html: string): Promise<string[]> {
  const report = await validator.validateString(html);
  return report.results.flatMap(({ messages }) =>
    messages.map(({ ruleId, message, selector, line }) => {
      return `${ruleId}: ${message} (line ${String(line)}, ${selector ?? ''})`;
    }),
  );
}

/** What axe finds wrong on a page as it is now: by all rules, or by those about colour. */
export async function findBarriers(page: Page, rules: 'all' | 'colour'): Promise<string[]> {
  // It stays in the page until the page is left.
  if (!(await page.evaluate(() => 'axe' in globalThis))) await page.evaluate(axe.source);
  const runOnly: axe.RunOnly =
    rules === 'all' ? { type: 'tag', values: TAGS } : { type: 'rule', values: COLOUR_RULES };
  return page.evaluate(async (only) => {
    const { run } = (globalThis as unknown as { axe: typeof axe }).axe;
    const { violations } = await run({ runOnly: only, resultTypes: ['violations'] });
    return violations.flatMap(({ id, nodes }) =>
      nodes.map(({ target, failureSummary = '' }) => `${id} at ${target.join(' ')}: ${failureSummary}`),
    );
  }, runOnly);
}

/** Gives a page another width, and waits until it is laid out and drawn at it. */
export async function setWidth(page: Page, width: number): Promise<void> {
  await page.setViewportSize({ width, height: 900 });
  await page.waitForFunction((wanted) => matchMedia(`(width: ${String(wanted)}px)`).matches, width);
  await page.evaluate(
    () => new Promise((drawn) => requestAnimationFrame(() => requestAnimationFrame(drawn))),
  );
}

/** By how many pixels a page is wider than the window. */
export function overhang(page: Page): Promise<number> {
  return page.evaluate(() => Math.max(0, document.documentElement.scrollWidth - innerWidth));
}

/** Everything that the keyboard should reach on a page, counted; a group of radio buttons is one stop. */
export function countStops(page: Page): Promise<number> {
  return page.evaluate(() => {
    // A grid is one stop, at the cell that would have the focus.
    const made = '[role=gridcell][tabindex="0"], [role=slider][tabindex="0"]';
    const stops = `a[href]:not([tabindex="-1"]), button, input:not([type=hidden]), select, textarea, summary, ${made}`;
    const reached = [...document.querySelectorAll(stops)].filter(
      (stop) => stop.checkVisibility() && !stop.matches(':disabled'),
    );
    const group = (stop: Element) =>
      stop instanceof HTMLInputElement && stop.type === 'radio' ? `radio ${stop.name}` : stop;
    return new Set(reached.map(group)).size;
  });
}

/**
 * Walks through a page with the tab key.
 * @returns how many stops there were, and those whose focus cannot be seen
 */
export async function walkByKeyboard(page: Page): Promise<{ stops: number; unseen: string[] }> {
  const unseen: string[] = [];
  for (let stops = 0; ; stops += 1) {
    await page.keyboard.press('Tab');
    const said = await page.evaluate(() => {
      const at = document.activeElement;
      // A link in a drawing is a stop, too.
      if (!(at instanceof HTMLElement || at instanceof SVGElement)) return null;
      if (at === document.body) return null;
      // A date field is walked through part by part.
      if (at.dataset['walked'] === 'last' && at.matches('input[type=date]')) return 'inside';
      if (at.dataset['walked']) return null;
      for (const last of document.querySelectorAll<HTMLElement>('[data-walked=last]'))
        last.dataset['walked'] = 'yes';
      at.dataset['walked'] = 'last';
      // A choice whose own box is not drawn shows the focus on its label.
      const drawn = (at.matches('.sr-only') && at.closest('label')) || at;
      const { outlineStyle, outlineWidth } = getComputedStyle(drawn);
      const { width, height, bottom, right } = drawn.getBoundingClientRect();
      const ring = outlineStyle !== 'none' && Number.parseFloat(outlineWidth) >= 2;
      const onPage = width > 1 && height > 1 && bottom > 0 && right > 0;
      return { seen: ring && onPage, what: `${at.tagName} ${(at.textContent ?? '').trim().slice(0, 40)}` };
    });
    if (said === null) return { stops, unseen };
    if (said === 'inside') stops -= 1;
    else if (!said.seen) unseen.push(said.what);
  }
}
