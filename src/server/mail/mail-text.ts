import type { Mail, MailBlock } from '../../domain/mail.ts';
import { cleanText, cleanUrl } from './clean-text.ts';

const COLUMNS = 72;

/** Breaks one line at spaces; a word longer than the line (an address) stays whole. */
function wrapLine(line: string, width: number): string[] {
  const lines: string[] = [];
  let current = '';
  for (const word of line.split(/ +/)) {
    const longer = current === '' ? word : `${current} ${word}`;
    if (current !== '' && [...longer].length > width) {
      lines.push(current);
      current = word;
    } else {
      current = longer;
    }
  }
  return [...lines, current];
}

function wrap(text: string, first = '', rest = first): string {
  return cleanText(text)
    .split('\n')
    .flatMap((line) => wrapLine(line.trim(), COLUMNS - rest.length))
    .map((line, index) => `${index === 0 ? first : rest}${line}`.trimEnd())
    .join('\n');
}

function blockText(block: MailBlock): string {
  switch (block.kind) {
    case 'paragraph':
    case 'small':
      return wrap(block.text);
    case 'action':
    case 'link':
      // The address has a line to itself, so that no program cuts it or takes a full stop into it.
      return `${wrap(`${block.label}:`)}\n${cleanUrl(block.url)}`;
    case 'code':
      return cleanText(block.text)
        .split('\n')
        .map((line) => `    ${line}`)
        .join('\n');
    case 'list':
      return block.items.map((item) => wrap(item, '- ', '  ')).join('\n');
  }
}

/**
 * The plain-text part of a mail: lines of at most 72 characters, each address on a line of its own.
 * @throws RangeError when an action's address is not http or https
 */
export function mailText(mail: Mail): string {
  return `${[...mail.blocks.map(blockText), '-- \nCentrepop'].join('\n\n')}\n`;
}
