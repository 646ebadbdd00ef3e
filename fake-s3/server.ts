import { createServer, type IncomingMessage, type ServerResponse } from 'node:http';
import { type AddressInfo } from 'node:net';
import { answer, type Service } from './answer.ts';
import { openStorage } from './storage.ts';

export type FakeS3Options = {
  /** Folder for everything kept. One server at a time may use it. */
  readonly folder: string;
  /** 0 for any free port. */
  readonly port: number;
  readonly region: string;
  readonly accessKeyId: string;
  readonly secretAccessKey: string;
  /** Made at start unless it is there. */
  readonly bucket?: string;
  /** Origins whose pages may read answers; `*` for any. Default: any. */
  readonly allowedOrigins?: readonly string[];
  /** What signatures' times are held against. Default: the system's clock. */
  readonly clock?: () => Date;
  /** Told of requests that failed for a reason that is not the client's. Default: a line on stderr. */
  readonly onFault?: (error: unknown) => void;
};

export type FakeS3 = {
  readonly port: number;
  /** Stops: requests under way may finish within five seconds, then their connections are cut. */
  close(): Promise<void>;
};

const GRACE_MS = 5000;

/**
 * Starts a stand-in for S3 on 127.0.0.1, path style, with one account. Resolves once it takes requests;
 * rejects with the system's error when the port is taken or the folder cannot be written.
 */
export async function startFakeS3(options: FakeS3Options): Promise<FakeS3> {
  let service: Service | undefined;
  let closing: Promise<void> | undefined;
  const underWay = new Set<Promise<void>>();
  const handle = (expectsContinue: boolean) => (incoming: IncomingMessage, response: ServerResponse) => {
    if (!service) {
      // Between taking the port and reading the folder; clients try again after this.
      response.writeHead(503, { 'retry-after': '1', connection: 'close' }).end();
      return;
    }
    const work = answer(service, incoming, response, expectsContinue);
    underWay.add(work);
    void work.finally(() => underWay.delete(work));
    // A connection that was busy when closing began is let go as soon as it is idle.
    response.once('close', () => {
      if (closing) server.closeIdleConnections();
    });
  };
  // A large upload over a slow line takes as long as it takes; clients hold idle connections for a while.
  const server = createServer({ requestTimeout: 0, keepAliveTimeout: 60_000 });
  server.on('request', handle(false));
  server.on('checkContinue', handle(true));

  // The port is taken before the folder is touched: a second start by mistake must not clear the first one's files.
  await new Promise<void>((resolve, reject) => {
    server.once('error', reject);
    server.listen(options.port, '127.0.0.1', resolve);
  });
  try {
    service = await openService(options);
  } catch (error) {
    server.close();
    server.closeAllConnections();
    throw error;
  }

  const close = async (): Promise<void> => {
    const closed = new Promise((resolve) => server.close(resolve));
    const cut = setTimeout(() => {
      server.closeAllConnections();
    }, GRACE_MS);
    await closed;
    clearTimeout(cut);
    await Promise.all(underWay);
  };
  return { port: (server.address() as AddressInfo).port, close: () => (closing ??= close()) };
}

async function openService(options: FakeS3Options): Promise<Service> {
  const { folder, bucket, region, accessKeyId, secretAccessKey } = options;
  const clock = options.clock ?? (() => new Date());
  const storage = await openStorage(folder);
  if (bucket !== undefined && !storage.objects.hasBucket(bucket)) {
    await storage.objects.createBucket(bucket, clock().toISOString());
  }
  return {
    account: { region, accessKeyId, secretAccessKey },
    storage,
    allowedOrigins: options.allowedOrigins ?? ['*'],
    clock,
    onFault: options.onFault ?? reportFault,
  };
}

function reportFault(error: unknown): void {
  const text = error instanceof Error ? (error.stack ?? error.message) : String(error);
  process.stderr.write(`fake-s3: ${text}\n`);
}
