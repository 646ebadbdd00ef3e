import type { Rule } from './behaviour.ts';
import { LINK, type Message } from './read-message.ts';

const ENTITIES: Readonly<Record<string, string>> = {
  '&': '&amp;',
  '<': '&lt;',
  '>': '&gt;',
  '"': '&quot;',
  "'": '&#39;',
};

function escapeHtml(text: string): string {
  return text.replace(/[&<>"']/g, (character) => ENTITIES[character] ?? '');
}

const WHEN = new Intl.DateTimeFormat('en-GB', { dateStyle: 'medium', timeStyle: 'medium' });

function timeHtml(iso: string): string {
  return `<time datetime="${iso}">${WHEN.format(new Date(iso))}</time>`;
}

function sizeText(bytes: number): string {
  return bytes < 1024 ? `${String(bytes)} bytes` : `${(bytes / 1024).toFixed(1)} KiB`;
}

/** A text with its web addresses made clickable. */
function linkedText(text: string): string {
  let html = '';
  let end = 0;
  for (const match of text.matchAll(LINK)) {
    const address = escapeHtml(match[0]);
    html += `${escapeHtml(text.slice(end, match.index))}<a href="${address}" target="_blank" rel="noreferrer">${address}</a>`;
    end = match.index + match[0].length;
  }
  return html + escapeHtml(text.slice(end));
}

function cell(label: string, html: string): string {
  return `<div class="cell"><p class="label">${label}</p><p class="value">${html}</p></div>`;
}

function page(title: string, block: string, main: string): string {
  return `<!DOCTYPE html>
<html lang="en">
<head>
<meta charset="utf-8">
<meta name="viewport" content="width=device-width, initial-scale=1">
<meta name="color-scheme" content="light dark">
<title>${escapeHtml(title)}</title>
<link rel="stylesheet" href="/style.css">
<link rel="icon" href="data:,">
</head>
<body>
<header>
${block}
</header>
<main>
${main}
</main>
</body>
</html>
`;
}

const RULE_WORDS = {
  accept: 'kept',
  refuse: 'refused for good',
  defer: 'put off until later',
  drop: 'cut off before the answer',
  hang: 'left without an answer',
} as const;

function ruleHtml({ recipient, answer, times }: Rule): string {
  const whose = recipient === '*' ? 'All mail' : `Mail to ${escapeHtml(recipient)}`;
  const howLong = times === undefined ? '' : times === 1 ? ', once more' : `, ${String(times)} more times`;
  return `<li>${whose} is ${RULE_WORDS[answer]}${howLong}.</li>`;
}

function rowHtml({ id, subject, to, receivedAt }: Message): string {
  return `<li class="row">
<a class="subject" href="/messages/${id}">${escapeHtml(subject) || 'Without a subject'}</a>
<span class="to">to ${escapeHtml(to.join(', '))}</span>
<span class="when">${timeHtml(receivedAt)}</span>
</li>`;
}

export type OutboxView = {
  readonly messages: readonly Message[];
  /** How many there are in all. */
  readonly count: number;
  readonly to: string | undefined;
  /** The id to go on from, when there are older ones. */
  readonly older: string | undefined;
  readonly rules: readonly Rule[];
};

/** The list of messages, newest first. */
export function outboxPage({ messages, count, to, older, rules }: OutboxView): string {
  const here = to === undefined ? '/' : `/?to=${encodeURIComponent(to)}`;
  const olderHref = older && `${here}${here.includes('?') ? '&amp;' : '?'}before=${older}`;
  const empty =
    to === undefined
      ? '<p class="empty">No mail yet. What the product sends while it runs on this machine is kept here, and goes nowhere else.</p>'
      : '<p class="empty">No mail to this address. <a href="/">Show all mail</a></p>';
  const block = `<div class="title-block">
<div class="cell wide"><p class="label">Centrepop</p><h1>Outbox: mail this copy would have sent</h1></div>
${cell('Messages', String(count))}
${cell('State', 'kept here, sent to nobody')}
<div class="cell do"><a class="button" href="${escapeHtml(here)}">Look again</a></div>
</div>`;
  const main = `${rules.length > 0 ? `<section class="told" aria-label="Told to misbehave"><ul>${rules.map(ruleHtml).join('')}</ul></section>` : ''}
<form class="filter" action="/" method="get"><label for="to">Mail to</label><input id="to" name="to" type="email" autocomplete="off" value="${escapeHtml(to ?? '')}"><button class="button" type="submit">Show</button></form>
${messages.length === 0 ? empty : `<ol class="messages">\n${messages.map(rowHtml).join('\n')}\n</ol>`}
${olderHref ? `<p><a href="${olderHref}">Older mail</a></p>` : ''}
${count === 0 ? '' : '<form action="/messages/delete" method="post"><button class="button danger" type="submit">Delete all messages</button></form>'}`;
  return page('Outbox', block, main);
}

function headerRows(message: Message): string {
  const { headers, envelope, from, replyTo, messageId, date } = message;
  const first = (name: string) => headers[name]?.join(' · ');
  const rows: readonly (readonly [string, string | undefined])[] = [
    ['From', from || 'nobody named'],
    ['Goes back to, if it cannot be delivered', envelope.from || 'nobody'],
    ['Replies go to', replyTo],
    ['Written', date && WHEN.format(new Date(date))],
    ['Message-ID', messageId],
    ['Part of the list', first('list-id')],
    ['Leaving the list', first('list-unsubscribe')],
    ['Leaving in one click', headers['list-unsubscribe-post'] && 'yes'],
    ['Sent by', headers['auto-submitted'] && 'a program, not a person'],
    ['Signed', headers['dkim-signature'] && 'yes, by its domain (DKIM)'],
  ];
  return rows
    .filter(([, value]) => value !== undefined && value !== '')
    .map(([name, value]) => `<div><dt>${name}</dt><dd>${escapeHtml(value ?? '')}</dd></div>`)
    .join('\n');
}

/** One message: what its reader would see, its text, what came with it and its source. */
export function messagePage(message: Message, source: string): string {
  const { id, subject, to, receivedAt, html, text, attachments } = message;
  const block = `<nav aria-label="Way back"><a href="/">Outbox</a></nav>
<div class="title-block">
<div class="cell wide"><p class="label">Message</p><h1>${escapeHtml(subject) || 'Without a subject'}</h1></div>
${cell('To', escapeHtml(to.join(', ')))}
${cell('Kept', timeHtml(receivedAt))}
</div>`;
  const files = attachments.map(
    ({ name, type, bytes }) => `<li>${escapeHtml(name)}, ${escapeHtml(type)}, ${sizeText(bytes)}</li>`,
  );
  const main = `<dl class="headers">
${headerRows(message)}
</dl>
${html === undefined ? '' : `<section><h2>As a mail program shows it</h2><iframe title="The mail as it is shown" sandbox="allow-popups allow-popups-to-escape-sandbox" src="/messages/${id}/shown"></iframe></section>`}
<section><h2>As plain text</h2><pre class="text">${linkedText(text)}</pre></section>
${files.length === 0 ? '' : `<section><h2>Attached</h2><ul>${files.join('')}</ul></section>`}
<details><summary>Source, ${sizeText(Buffer.byteLength(source))}</summary><pre>${escapeHtml(source.slice(0, 65_536))}</pre></details>
<p><a href="/messages/${id}.eml">Download the message as a file</a></p>`;
  return page(`${subject || 'Without a subject'} · Outbox`, block, main);
}

/** The HTML part made fit for its frame: links open in a tab of their own. */
export function framedHtml(html: string): string {
  const base = '<base target="_blank">';
  return /<head[^>]*>/i.test(html) ? html.replace(/<head[^>]*>/i, (head) => head + base) : base + html;
}

/** A plain sentence as a page, for an address where nothing is. */
export function sentencePage(sentence: string): string {
  const block = `<div class="title-block"><div class="cell wide"><p class="label">Outbox</p><h1>${escapeHtml(sentence)}</h1></div></div>`;
  return page('Outbox', block, '<p><a href="/">Show all mail</a></p>');
}
