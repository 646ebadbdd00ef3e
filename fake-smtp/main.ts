import { CannotStart, startFakeSmtp } from './start.ts';

function readPort(name: string): number {
  const port = Number(process.env[name] ?? '0');
  if (!Number.isInteger(port) || port < 0 || port > 65_535) {
    throw new CannotStart(`${name} must be a port number, or 0 for any.`);
  }
  return port;
}

async function run(): Promise<void> {
  const folder = process.env['FAKE_SMTP_DIR'] ?? '';
  if (folder === '') throw new CannotStart('FAKE_SMTP_DIR must name the folder to keep mail in.');
  const { port, pagePort, close } = await startFakeSmtp({
    folder,
    port: readPort('FAKE_SMTP_PORT'),
    pagePort: readPort('FAKE_SMTP_PAGE_PORT'),
  });
  let ending = false;
  const end = () => {
    if (ending) return;
    ending = true;
    void close().finally(() => process.exit(0));
  };
  process.on('SIGTERM', end);
  process.on('SIGINT', end);
  process.on('disconnect', end);
  process.send?.({ ready: true, port, pagePort });
  console.log(
    `Mail is kept, not sent, by 127.0.0.1:${String(port)}; read it at http://127.0.0.1:${String(pagePort)}/`,
  );
}

try {
  await run();
} catch (error) {
  if (!(error instanceof CannotStart)) throw error;
  console.error(error.message);
  process.exitCode = 1;
  if (process.connected) process.disconnect();
}
