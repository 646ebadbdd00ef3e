import { mkdir, writeFile } from 'node:fs/promises';
import { join } from 'node:path';
import { gzipSync } from 'node:zlib';

export type NginxSite = {
  readonly folder: string;
  readonly port: number;
  /** Where the page is, with its leading slash. */
  readonly path: string;
  readonly body: Buffer;
  /** The gzip form that is served, so that both servers send the same bytes. */
  readonly gzipped: Buffer;
  readonly headers: readonly (readonly [string, string])[];
};

/**
 * Lays out a folder from which nginx serves one page as a file with a precompressed form beside it: one worker,
 * open files cached, a buffered access log, nothing outside the folder.
 * @returns the configuration's file
 */
export async function writeNginxSite(site: NginxSite): Promise<string> {
  const { folder, port, path, headers } = site;
  const file = join(folder, 'site', path);
  await mkdir(join(file, '..'), { recursive: true });
  await writeFile(file, site.body);
  await writeFile(`${file}.gz`, site.gzipped.length > 0 ? site.gzipped : gzipSync(site.body));
  const quoted = headers.map(
    ([name, value]) => `      add_header ${name} "${value.replaceAll('"', '\\"')}";`,
  );
  const temporary = ['client_body', 'proxy', 'fastcgi', 'uwsgi', 'scgi'].map(
    (name) => `  ${name}_temp_path ${folder}/temp-${name};`,
  );
  const lines = [
    // Its worker must be able to read a folder that only this account can enter.
    ...(process.getuid?.() === 0 ? ['user root;'] : []),
    'daemon off;',
    'worker_processes 1;',
    `pid ${folder}/nginx.pid;`,
    `error_log ${folder}/nginx-errors.log warn;`,
    'events { worker_connections 1024; }',
    'http {',
    ...temporary,
    '  sendfile on;',
    '  tcp_nopush on;',
    '  tcp_nodelay on;',
    '  keepalive_requests 1000000000;',
    '  open_file_cache max=100 inactive=300s;',
    '  open_file_cache_valid 300s;',
    `  log_format facts '$request_id $request_method $uri $status $request_time';`,
    `  access_log ${folder}/nginx-requests.log facts buffer=64k;`,
    '  server_tokens off;',
    '  server {',
    `    listen 127.0.0.1:${String(port)};`,
    `    root ${folder}/site;`,
    '    default_type "text/html; charset=utf-8";',
    '    gzip_static on;',
    '    gzip_vary on;',
    '    location / {',
    ...quoted,
    '      add_header X-Request-Id $request_id;',
    '    }',
    '  }',
    '}',
  ];
  const configuration = join(folder, 'nginx.conf');
  await writeFile(configuration, `${lines.join('\n')}\n`);
  return configuration;
}
