import { readFileSync } from 'node:fs';
import * as fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import type { Mail } from '../../../src/domain/mail.ts';
import { renderMail } from '../../../src/server/mail/render-mail.ts';

const LINK = `https://press.example/confirm?token=${'k7'.repeat(60)}&from=mail`;

const mail: Mail = {
  subject: 'Confirm your address',
  preview: 'One click, and you hear of the next episode.',
  blocks: [
    { kind: 'paragraph', text: 'Hello Wren,\nyou asked to hear of the next episode.' },
    { kind: 'action', label: 'Confirm my address', url: LINK },
    {
      kind: 'list',
      items: [
        'Part 118, bearing housing, whose feet are slotted so that the drum can be squared up',
        'Part 119',
      ],
    },
    { kind: 'code', text: '4821 9930' },
    { kind: 'small', text: 'The link holds for a day.' },
  ],
};

const withText = (text: string): Mail => ({ subject: 'A note', blocks: [{ kind: 'paragraph', text }] });

describe('the text part', () => {
  test('gives an address a line of its own, whole', () => {
    expect(renderMail(mail).text.split('\n')).toContain(LINK);
  });

  test('gives a quiet link a line of its own, too, and escapes it in HTML', () => {
    const { text, html } = renderMail({
      subject: 'A',
      blocks: [{ kind: 'link', label: '<Leave>', url: LINK }],
    });
    expect(text.split('\n')).toContain(LINK);
    expect(html).toContain('&lt;Leave&gt;');
    expect(html).toContain(`href="${LINK.replace('&', '&amp;')}"`);
  });

  test('keeps the line breaks of a paragraph and sets off a code', () => {
    const { text } = renderMail(mail);
    expect(text).toContain('Hello Wren,\nyou asked');
    expect(text).toContain('\n\n    4821 9930\n\n');
  });

  test('hangs the second line of an item under the first', () => {
    expect(renderMail(mail).text).toContain(
      '- Part 118, bearing housing, whose feet are slotted so that the drum can\n  be squared up\n- Part 119',
    );
  });

  test('breaks lines at 72 characters, and only words that are longer go over', () => {
    fc.assert(
      fc.property(fc.lorem({ maxCount: 80 }), (words) => {
        const { text } = renderMail(withText(words));
        for (const line of text.split('\n')) expect(line.length).toBeLessThanOrEqual(72);
        expect(text.replace(/\s+/g, ' ')).toContain(words.trim().replace(/\s+/g, ' '));
      }),
    );
  });

  test('is exactly this for a whole mail', () => {
    expect(renderMail(mail).text).toBe(readFileSync(new URL('confirm.txt', import.meta.url), 'utf8'));
  });
});

describe('the HTML part', () => {
  test('shows markup in a text as text', () => {
    const { html } = renderMail({
      subject: 'A <b>bold</b> subject',
      preview: '</div><script>1</script>',
      blocks: [
        { kind: 'paragraph', text: '<img src=x onerror="1">' },
        { kind: 'list', items: ['<i>item</i>'] },
        { kind: 'code', text: '<u>code</u>' },
        { kind: 'small', text: "O'Brien & <s>sons</s>" },
        { kind: 'action', label: '<em>Go</em>', url: 'https://press.example/?a="><script>' },
      ],
    });
    expect(html).not.toMatch(/<(b|script|img|i|u|s|em)[ >]/);
    expect(html).toContain('O&#39;Brien &amp; &lt;s&gt;sons&lt;/s&gt;');
    expect(html).toContain('A &lt;b&gt;bold&lt;/b&gt; subject');
  });

  test('fetches nothing', () => {
    expect(renderMail(mail).html).not.toMatch(/<(img|link|iframe|video|script)|url\(|@import|src=/);
  });

  test('links exactly where the action says', () => {
    expect(renderMail(mail).html).toContain(`<a class="do" href="${LINK.replaceAll('&', '&amp;')}"`);
  });

  test('hides the preview from the page and leaves it out when there is none', () => {
    expect(renderMail(mail).html).toMatch(/display:none[^>]*>One click, and you hear/);
    expect(renderMail(withText('Hello')).html).not.toContain('display:none');
  });
});

test.each(['javascript:alert(1)', 'data:text/html,x', '/confirm', 'press.example', ''])(
  'an action cannot lead to "%s"',
  (url) => {
    const wrong: Mail = { subject: 'x', blocks: [{ kind: 'action', label: 'Go', url }] };
    expect(() => renderMail(wrong)).toThrow(RangeError);
  },
);

describe('the subject', () => {
  test('never holds a line break or another control character', () => {
    fc.assert(
      fc.property(fc.string({ unit: 'binary' }), (subject) => {
        const shown = renderMail({ subject, blocks: [] }).subject;
        expect(shown).not.toMatch(/[\p{Cc}\u2028\u2029\u202A-\u202E]/u);
        expect([...shown].length).toBeLessThanOrEqual(200);
        expect(shown).not.toBe('');
      }),
    );
  });

  test('cannot start a header of its own', () => {
    const subject = 'Episode 4\r\nBcc: everyone@example.com\u2028X: 1';
    expect(renderMail({ subject, blocks: [] }).subject).toBe('Episode 4 Bcc: everyone@example.com X: 1');
  });

  test('ends at 200 characters with a mark, never within one', () => {
    const { subject } = renderMail({ subject: '🔩'.repeat(300), blocks: [] });
    expect([...subject]).toHaveLength(200);
    expect(subject).toBe(`${'🔩'.repeat(199)}…`);
  });

  test('is the name of the product when nothing is left of it', () => {
    expect(renderMail({ subject: '\r\n \u0000', blocks: [] }).subject).toBe('Centrepop');
  });
});
