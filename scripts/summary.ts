import { type DemoAccount } from './demo.ts';

/** What a person who has just started this needs to know. */
export type Summary = {
  readonly url: string;
  readonly outboxUrl?: string | undefined;
  readonly accounts: readonly DemoAccount[];
};

function inWords(name: string): string {
  return name.replace(/[A-Z]/g, (letter) => ` ${letter.toLowerCase()}`);
}

/** The lines that are printed when everything runs. */
export function summarise({ url, outboxUrl, accounts }: Summary): string {
  const lines = ['', `Centrepop is running: ${url}`];
  if (outboxUrl !== undefined) lines.push(`Its mail is kept here:  ${outboxUrl}`);
  if (accounts.length > 0) {
    lines.push('Demo accounts:');
    const width = Math.max(...accounts.map(({ email = '' }) => email.length));
    for (const { email = '', password = '', who = '', ...rest } of accounts) {
      const more = Object.entries(rest).map(([name, value]) => `, ${inWords(name)}: ${value}`);
      lines.push(`  ${email.padEnd(width)}  ${password}  ${who}${more.join('')}`.trimEnd());
    }
  }
  lines.push('Ctrl-C stops it.', '');
  return lines.join('\n');
}
