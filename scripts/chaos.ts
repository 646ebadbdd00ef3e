import { announceUnderFire, SUBSCRIBERS } from '../tests/chaos/announcement.ts';

/** Announces to 500 under kills, as many rounds as asked for: `npm run chaos -- 3`. Needs a build. */
async function runChaos(rounds: number): Promise<void> {
  console.log(
    `An announcement to ${String(SUBSCRIBERS)}, ${String(rounds)} times, parts killed meanwhile.\n`,
  );
  for (let round = 1; round <= rounds; round += 1) {
    const { addresses, doubled, strange, kills, states, seconds, held } = await announceUnderFire(
      Math.random,
    );
    const killed = Object.entries(kills).map(([part, count]) => `${part} ${String(count)}`);
    console.log(
      `${held ? 'held' : 'BROKE'}  round ${String(round)}: ${String(addresses)} addresses, ${String(doubled)} mails doubled ` +
        `(${String(strange)} under another Message-ID), messages ${JSON.stringify(states)}, ` +
        `killed ${killed.join(', ')}, ${String(seconds)} s`,
    );
    // The other rounds still have something to say.
    if (!held) process.exitCode = 1;
  }
}

const [asked = '20'] = process.argv.slice(2);
if (!/^[1-9]\d{0,2}$/.test(asked)) {
  console.error('Say how many rounds, such as: npm run chaos -- 3');
  process.exitCode = 2;
} else {
  await runChaos(Number(asked));
}
