import { startFakeS3, type FakeS3, type FakeS3Options } from './server.ts';

// The stand-in for S3 as a process of its own. Settings come as FAKE_S3_* variables; a parent process with a
// channel is told the port, and its going away ends this process too.

/** Reads the settings. Throws with one plain sentence when one is missing or wrong. */
function readSettings(env: NodeJS.ProcessEnv): FakeS3Options {
  const required = (name: string): string => {
    const value = env[name];
    if (!value) throw new Error(`${name} is not set.`);
    return value;
  };
  const port = Number(required('FAKE_S3_PORT'));
  if (!Number.isInteger(port) || port < 0 || port > 65_535) {
    throw new Error('FAKE_S3_PORT is not a port number from 0 to 65535.');
  }
  return {
    folder: required('FAKE_S3_DIR'),
    port,
    bucket: required('FAKE_S3_BUCKET'),
    region: required('FAKE_S3_REGION'),
    accessKeyId: required('FAKE_S3_ACCESS_KEY_ID'),
    secretAccessKey: required('FAKE_S3_SECRET_ACCESS_KEY'),
    allowedOrigins: (env['FAKE_S3_ALLOW_ORIGIN'] ?? '*').split(',').map((origin) => origin.trim()),
  };
}

/** One sentence for whoever started this, from an error of the start. */
function sentence(error: unknown, { FAKE_S3_PORT: port, FAKE_S3_DIR: folder }: NodeJS.ProcessEnv): string {
  const { code, message } = error as NodeJS.ErrnoException;
  if (code === 'EADDRINUSE') return `Port ${port ?? ''} on 127.0.0.1 is already in use.`;
  if (code === 'EACCES' && message.includes('listen'))
    return `Port ${port ?? ''} may not be used by this account.`;
  if (code !== undefined && /^E[A-Z]+$/.test(code))
    return `The folder ${folder ?? ''} cannot be used (${code}).`;
  return message;
}

function stopWhenTold(server: FakeS3): void {
  const stop = (): void => {
    void server.close().then(() => {
      process.exit(0);
    });
  };
  process.once('SIGTERM', stop);
  process.once('SIGINT', stop);
  process.once('disconnect', stop);
}

try {
  const server = await startFakeS3(readSettings(process.env));
  stopWhenTold(server);
  process.stdout.write(`Storage stand-in listening on http://127.0.0.1:${String(server.port)}\n`);
  process.send?.({ ready: true, port: server.port });
} catch (error) {
  process.stderr.write(`fake-s3: ${sentence(error, process.env)}\n`);
  process.exitCode = 1;
  process.disconnect?.();
}
