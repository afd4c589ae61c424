import { openBrowser } from './visitor';

/*
 * What the first visit to the sign-in page transfers, headers and fonts included, as Chromium counts it,
 * before the service worker fetches the rest for working without signal:
 *
 *     npx tsx tests/browser/measureFirstLoad.ts http://localhost:4300
 */
const TARGET = 250;
const url = process.argv[2];
if (!url) throw new Error('Which address?');
const browser = await openBrowser();
try {
  const context = await browser.newContext({
    viewport: { width: 360, height: 740 },
    serviceWorkers: 'block',
  });
  const page = await context.newPage();
  const session = await context.newCDPSession(page);
  await session.send('Network.enable');
  let bytes = 0;
  let requests = 0;
  session.on('Network.loadingFinished', ({ encodedDataLength }) => {
    bytes += encodedDataLength;
    requests += 1;
  });
  await page.goto(`${url}/sign-in`, { waitUntil: 'networkidle' });
  await page.getByRole('button', { name: 'Sign in' }).waitFor();
  process.stdout.write(
    `first load of /sign-in: ${(bytes / 1000).toFixed(1)} kB in ${requests} requests; target < ${TARGET} kB\n`,
  );
} finally {
  await browser.close();
}
