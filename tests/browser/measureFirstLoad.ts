import type { Browser } from 'playwright-core';
import { startTlsProxy } from './tlsProxy';
import { openBrowser } from './visitor';

/*
 * What the first visit to the sign-in page transfers, headers and fonts included, as Chromium counts it,
 * before the service worker fetches the rest for working without signal:
 *
 *     npx tsx tests/browser/measureFirstLoad.ts http://localhost:4300
 *
 * By TLS, as a phone gets it (brotli, HTTP/2); beside it plain HTTP on loopback (gzip).
 */
const TARGET = 250;
const url = process.argv[2];
if (!url) throw new Error('Which address?');

async function firstLoad(
  browser: Browser,
  address: string,
): Promise<[bytes: number, count: number]> {
  const context = await browser.newContext({
    viewport: { width: 360, height: 740 },
    serviceWorkers: 'block',
    ignoreHTTPSErrors: true,
  });
  const page = await context.newPage();
  const session = await context.newCDPSession(page);
  await session.send('Network.enable');
  let bytes = 0;
  let count = 0;
  session.on('Network.loadingFinished', ({ encodedDataLength }) => {
    bytes += encodedDataLength;
    count += 1;
  });
  await page.goto(`${address}/sign-in`, { waitUntil: 'networkidle' });
  await page.getByRole('button', { name: 'Sign in' }).waitFor();
  await context.close();
  return [bytes, count];
}

const proxy = await startTlsProxy(url);
const browser = await openBrowser();
try {
  for (const [name, address] of [
    ['by TLS', proxy.url],
    ['plain HTTP', url],
  ] as const) {
    const [bytes, count] = await firstLoad(browser, address);
    process.stdout.write(
      `first load of /sign-in, ${name}: ${(bytes / 1000).toFixed(1)} kB in ${count} requests; target < ${TARGET} kB\n`,
    );
  }
} finally {
  await browser.close();
  proxy.close();
  process.exit();
}
