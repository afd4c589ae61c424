import { mkdirSync } from 'node:fs';
import { join } from 'node:path';
import type { Page } from 'playwright-core';
import { huntByPractice } from './hunt';
import { openBrowser, Visitor } from './visitor';

/*
 * Takes the README's pictures from a running product with the demo in it:
 *
 *     npx tsx tests/browser/takeScreens.ts http://localhost:4300
 *
 * It opens a case and leaves it open: take them from a demo that is thrown away.
 */
const FOLDER = 'tests/browser/screens';
const url = process.argv[2];
if (!url)
  throw new Error('Which address? npx tsx tests/browser/takeScreens.ts http://localhost:4300');
mkdirSync(FOLDER, { recursive: true });

const take = async (page: Page, name: string): Promise<void> => {
  // Lamps light in 160 ms, sections narrow in 240.
  await page.waitForTimeout(400);
  await page.screenshot({ path: join(FOLDER, `${name}.png`) });
};

const browser = await openBrowser();
try {
  const phone = await Visitor.open(browser, url, 'phone', 'dark');
  await phone.signIn('jonas@fennimore.example');
  const { page } = phone;
  await page.getByRole('heading', { name: 'Saltmarsh House' }).waitFor();
  await page.getByRole('link', { name: /^Lift 1/ }).click();
  await phone.button('Not moving').click();
  await phone.button('Start a case').click();
  await phone.button('Yes, all safe').click();
  await phone.button('Up').click();
  await phone.button(/^Meter proven/).click();
  await phone.button('Practice: look at all relays').click();
  await page.waitForTimeout(800);
  await phone.button('Start finding').click();
  let readings = 0;
  await huntByPractice(phone, async (kind) => {
    if (kind === 'reading') readings += 1;
    if (kind === 'reading' && readings === 4) await take(page, 'reading-phone-dark');
    if (kind === 'finding') await take(page, 'finding-phone-dark');
  });
  await page.emulateMedia({ colorScheme: 'light' });
  await take(page, 'finding-phone-light');
  await phone.close();

  const desk = await Visitor.open(browser, url, 'desk', 'light');
  await desk.signIn('ruth@fennimore.example');
  await desk.page.getByRole('heading', { name: 'To review' }).waitFor();
  await desk.page
    .getByRole('link', { name: /Saltmarsh House, Lift 2/ })
    .first()
    .waitFor();
  await desk.page
    .getByRole('link', { name: /Saltmarsh House, Lift 2/ })
    .first()
    .click();
  await desk.page.getByText('the proof').waitFor();
  await take(desk.page, 'review-desk-light');
  await desk.close();
} finally {
  await browser.close();
}
