import { TOTP } from 'otpauth';
import { openDatabase } from '../../db/client.ts';
import { readDatabaseUrl } from '../env.ts';
import { resetSecondFactor } from './reset-second-factor.ts';

const USAGE = `Use:
  npm run centrepop-admin -- reset-second-factor ADDRESS   for someone who lost phone and recovery codes
  npm run centrepop-admin -- code KEY                      the six digits that an authenticator app would show`;

async function run([command, argument]: readonly string[]): Promise<string> {
  if (command === 'code' && argument !== undefined) return new TOTP({ secret: argument }).generate();
  if (command !== 'reset-second-factor' || argument === undefined) throw new Error(USAGE);
  const database = openDatabase(readDatabaseUrl());
  try {
    return await resetSecondFactor(database.db, argument);
  } finally {
    await database.close();
  }
}

try {
  process.stdout.write(`${await run(process.argv.slice(2))}\n`);
} catch (error) {
  process.stderr.write(`${error instanceof Error ? error.message : String(error)}\n`);
  process.exitCode = 2;
}
