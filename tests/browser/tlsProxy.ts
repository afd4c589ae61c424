import { execFileSync } from 'node:child_process';
import { mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { request } from 'node:http';
import { createSecureServer } from 'node:http2';
import type { AddressInfo } from 'node:net';
import { tmpdir } from 'node:os';
import { join } from 'node:path';

export interface TlsProxy {
  readonly url: string;
  close(): void;
}

/** Headers of one hop, which HTTP/2 does not have. */
const OF_ONE_HOP = new Set(['connection', 'keep-alive', 'transfer-encoding', 'host']);

/**
 * TLS with HTTP/2 in front of a product on loopback, with a certificate of its own, as a real phone would
 * meet it: only there does a browser ask for brotli.
 */
export async function startTlsProxy(target: string): Promise<TlsProxy> {
  const folder = mkdtempSync(join(tmpdir(), 'lampline-tls-'));
  const [key, cert] = [join(folder, 'key.pem'), join(folder, 'cert.pem')];
  execFileSync(
    'openssl',
    [
      ...['req', '-x509', '-newkey', 'rsa:2048', '-nodes', '-days', '1', '-subj', '/CN=localhost'],
      ...['-keyout', key, '-out', cert],
    ],
    { stdio: 'pipe' },
  );
  const server = createSecureServer(
    { key: readFileSync(key), cert: readFileSync(cert), allowHTTP1: true },
    (incoming, outgoing) => {
      const headers = Object.fromEntries(
        Object.entries(incoming.headers).filter(([name]) => !name.startsWith(':')),
      );
      const onward = request(
        new URL(incoming.url, target),
        { method: incoming.method, headers: { ...headers, host: new URL(target).host } },
        (answer) => {
          const kept = Object.entries(answer.headers).filter(([name]) => !OF_ONE_HOP.has(name));
          outgoing.writeHead(answer.statusCode ?? 502, Object.fromEntries(kept));
          answer.pipe(outgoing);
        },
      );
      onward.on('error', () => outgoing.end());
      incoming.pipe(onward);
    },
  );
  await new Promise<void>((listening) => server.listen(0, '127.0.0.1', () => listening()));
  rmSync(folder, { recursive: true });
  return {
    url: `https://localhost:${(server.address() as AddressInfo).port}`,
    close: () => server.close(),
  };
}
