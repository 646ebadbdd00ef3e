import type { Mail, MailBlock } from '../../domain/mail.ts';
import { cleanLine, cleanSubject, cleanText, cleanUrl } from './clean-text.ts';

const FONT = "font-family:Karla,'Segoe UI',Helvetica,Arial,sans-serif";
const MONO = "font-family:'Spline Sans Mono',Consolas,Menlo,monospace";

// Mailboxes that know dark mode read these; the others keep the light colours written at each element.
const DARK = `
:root { color-scheme: light dark; supported-color-schemes: light dark; }
@media (prefers-color-scheme: dark) {
  .ground { background: #14191c !important; }
  .sheet { background: #1d2427 !important; border-color: #4b565c !important; }
  .words { color: #e8eceb !important; }
  .fine { color: #b3bcbb !important; }
  .code { background: #2b2a1f !important; border-color: #d9a441 !important; color: #f6ecd6 !important; }
  .do { background: #d9a441 !important; border-color: #d9a441 !important; color: #1a2024 !important; }
  .address { color: #b9c3f0 !important; }
}`;

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

function inline(text: string): string {
  return escapeHtml(cleanText(text)).replace(/\n/g, '<br>');
}

function actionHtml(label: string, url: string): string {
  const address = escapeHtml(cleanUrl(url));
  const button = `display:inline-block;padding:12px 20px;background:#202c82;border:1px solid #202c82;color:#ffffff;font-weight:bold;text-decoration:none`;
  return (
    `<p style="margin:24px 0 8px"><a class="do" href="${address}" style="${button}">${escapeHtml(cleanLine(label))}</a></p>\n` +
    `<p class="fine" style="margin:0 0 24px;font-size:14px;line-height:20px;color:#4b565c">Or open this address: ` +
    `<a class="address" href="${address}" style="color:#202c82;word-break:break-all">${address}</a></p>`
  );
}

function blockHtml(block: MailBlock): string {
  switch (block.kind) {
    case 'paragraph':
      return `<p style="margin:0 0 16px">${inline(block.text)}</p>`;
    case 'small':
      return `<p class="fine" style="margin:0 0 12px;font-size:14px;line-height:20px;color:#4b565c">${inline(block.text)}</p>`;
    case 'action':
      return actionHtml(block.label, block.url);
    case 'link':
      return `<p class="fine" style="margin:0 0 12px;font-size:14px;line-height:20px;color:#4b565c"><a class="address" href="${escapeHtml(cleanUrl(block.url))}" style="color:#202c82">${escapeHtml(cleanLine(block.label))}</a></p>`;
    case 'code':
      return `<p class="code" style="margin:0 0 16px;padding:12px 16px;background:#f6ecd6;border:1px solid #8a6112;color:#1a2024;${MONO};font-size:20px;word-break:break-all">${inline(block.text)}</p>`;
    case 'list':
      return `<ul style="margin:0 0 16px;padding-left:24px">${block.items.map((item) => `<li style="margin:0 0 6px">${inline(item)}</li>`).join('')}</ul>`;
  }
}

/** The line a mailbox shows beside the subject, followed by blanks so that it takes nothing after it. */
function previewHtml(preview: string | undefined): string {
  if (preview === undefined) return '';
  const blanks = '&#8199;&#847; '.repeat(60);
  return `<div style="display:none;max-height:0;overflow:hidden">${escapeHtml(cleanLine(preview))}${blanks}</div>\n`;
}

/**
 * The HTML part of a mail: one column, styles at each element, a title block at the head. Every text
 * is escaped; nothing is fetched from anywhere.
 * @throws RangeError when an action's address is not http or https
 */
export function mailHtml(mail: Mail): string {
  const subject = escapeHtml(cleanSubject(mail.subject));
  const ring =
    'display:inline-block;width:6px;height:6px;border:3px solid #d9a441;border-radius:50%;margin-right:10px';
  return `<!doctype html>
<html lang="en">
<head>
<meta charset="utf-8">
<meta name="viewport" content="width=device-width, initial-scale=1">
<meta name="color-scheme" content="light dark">
<meta name="supported-color-schemes" content="light dark">
<title>${subject}</title>
<style>${DARK}
</style>
</head>
<body class="ground" style="margin:0;padding:0;background:#f2f5f4">
${previewHtml(mail.preview)}<div class="ground" style="padding:24px 12px;background:#f2f5f4">
<div class="sheet" style="max-width:600px;margin:0 auto;background:#fcfdfc;border:1px solid #1a2024">
<div style="padding:12px 24px;background:#121a52;color:#ffffff;${FONT};font-size:18px;font-weight:bold"><span style="${ring}"></span>Centrepop</div>
<div class="sheet words" style="padding:16px 24px;border-bottom:1px solid #1a2024;color:#1a2024;${FONT}">
<h1 class="words" style="margin:0;font-size:22px;line-height:28px;color:#1a2024">${subject}</h1>
</div>
<div class="words" style="padding:24px 24px 12px;color:#1a2024;${FONT};font-size:16px;line-height:24px;overflow-wrap:break-word">
${mail.blocks.map(blockHtml).join('\n')}
</div>
</div>
</div>
</body>
</html>
`;
}
