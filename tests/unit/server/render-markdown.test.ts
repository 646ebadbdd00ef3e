import { describe, expect, test } from 'vitest';
import { renderMarkdown } from '../../../src/server/render-markdown.ts';

describe('written text', () => {
  test.each([
    ['**b** and *i*', '<p><strong>b</strong> and <em>i</em></p>'],
    ['one\ntwo', '<p>one<br />two</p>'],
    ['# Head', '<h4>Head</h4>'],
    ['a < b & c', '<p>a &lt; b &amp; c</p>'],
    ['[w](https://a.example)', '<p><a href="https://a.example" rel="nofollow ugc">w</a></p>'],
    ['3. three', '<ol start="3">\n<li>three</li>\n</ol>'],
  ])('%j is shown', (text, html) => {
    expect(renderMarkdown(text)).toBe(html);
  });

  test.each([
    '<script>alert(1)</script>',
    '<img src=x onerror=alert(1)>',
    '![x](https://spy.example/pixel.png)',
    '[x](javascript:alert(1))',
    '[x](JaVaScRiPt&#58;alert(1))',
    '[x](data:text/html;base64,PHNjcmlwdD4=)',
    '<a href="//spy.example" onclick="alert(1)" style="x" class="y" id="z">x</a>',
    '<svg><script>alert(1)</script></svg>',
    '<iframe srcdoc="<script>alert(1)</script>"></iframe>',
    '<form action="/x"><input name=q></form>',
    '<style>*{display:none}</style>',
    '<math><mtext></form><form><mglyph><style></math><img src onerror=alert(1)>',
    '<p style="position:fixed">x</p>',
  ])('%j is harmless', (text) => {
    const html = renderMarkdown(text);
    expect(html).not.toMatch(
      /<(script|img|svg|iframe|form|input|style|math)|\son\w+=|style=|class=|id=|javascript:|data:|spy\.example/i,
    );
  });

  test('of nothing is nothing', () => {
    expect(renderMarkdown('')).toBe('');
  });
});
