import { execFileSync } from 'node:child_process';
import { existsSync, rmSync, writeFileSync } from 'node:fs';

const START_POLICY = '/usr/sbin/policy-rc.d';

/**
 * Sees to it that Debian programs are there, installing them when run by root.
 * @param programs path of each program and the package that brings it
 * @throws with the command to run, when not root
 */
export function needPrograms(programs: Readonly<Record<string, string>>): void {
  const missing = Object.entries(programs)
    .filter(([path]) => !existsSync(path))
    .map(([, name]) => name);
  if (missing.length === 0) return;
  const command = ['apt-get', 'install', '-y', '--no-install-recommends', ...missing];
  if (process.getuid?.() !== 0) {
    throw new Error(`This bench needs ${missing.join(' and ')}. Run as root: ${command.join(' ')}`);
  }
  // A package may start a service of its own as it is installed; this is Debian's way to say no.
  const policy = !existsSync(START_POLICY);
  if (policy) writeFileSync(START_POLICY, '#!/bin/sh\nexit 101\n', { mode: 0o755 });
  try {
    execFileSync('apt-get', ['update', '-q'], { stdio: 'inherit' });
    execFileSync('apt-get', command.slice(1), { stdio: 'inherit' });
  } finally {
    if (policy) rmSync(START_POLICY);
  }
}
