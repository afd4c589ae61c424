import { createServer } from 'node:net';

/** Whether nothing listens on this port of the loopback. */
export function isFree(port: number): Promise<boolean> {
  return new Promise((resolve) => {
    const probe = createServer();
    probe.once('error', () => resolve(false));
    probe.listen(port, '127.0.0.1', () => probe.close(() => resolve(true)));
  });
}

/** A port that the system has just had free. Another process may take it: whoever uses it retries. */
export function anyFreePort(): Promise<number> {
  return new Promise((resolve, reject) => {
    const probe = createServer();
    probe.once('error', reject);
    probe.listen(0, '127.0.0.1', () => {
      const address = probe.address();
      probe.close(() =>
        typeof address === 'object' && address
          ? resolve(address.port)
          : reject(new Error('The system gave no port.')),
      );
    });
  });
}

/** How many ports above the wanted one are tried. */
const PORTS_TRIED = 50;

/** The first free port from `first` upwards. */
export async function freePortFrom(first: number): Promise<number> {
  for (let port = first; port < first + PORTS_TRIED; port++) {
    if (await isFree(port)) return port;
  }
  return anyFreePort();
}
