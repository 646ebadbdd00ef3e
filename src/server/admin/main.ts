import { TOTP } from 'otpauth';
import { openDatabase } from '../../db/client.ts';
import { paths } from '../../paths.ts';
import { readDatabaseUrl, readSettings } from '../env.ts';
import { bounceToken } from '../mail/bounce-token.ts';
import { resetSecondFactor } from './reset-second-factor.ts';

const USAGE = `Use:
  npm run centrepop-admin -- reset-second-factor ADDRESS   for someone who lost phone and recovery codes
  npm run centrepop-admin -- code KEY                      the six digits that an authenticator app would show
  npm run centrepop-admin -- bounce-address   where a mail server reports what came back`;

async function run([command, argument]: readonly string[]): Promise<string> {
  if (command === 'code' && argument !== undefined) return new TOTP({ secret: argument }).generate();
  if (command === 'bounce-address') return bounceAddress();
  if (command !== 'reset-second-factor' || argument === undefined) throw new Error(USAGE);
  const database = openDatabase(readDatabaseUrl());
  try {
    return await resetSecondFactor(database.db, argument);
  } finally {
    await database.close();
  }
}

function bounceAddress(): string {
  const { BOUNCE_SECRET, PUBLIC_URL } = readSettings();
  if (BOUNCE_SECRET === undefined) throw new Error('BOUNCE_SECRET must be set.');
  return PUBLIC_URL + paths.api.bounces(bounceToken(BOUNCE_SECRET));
}

try {
  process.stdout.write(`${await run(process.argv.slice(2))}\n`);
} catch (error) {
  process.stderr.write(`${error instanceof Error ? error.message : String(error)}\n`);
  process.exitCode = 2;
}
