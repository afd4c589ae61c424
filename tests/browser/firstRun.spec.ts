import type { Browser } from 'playwright-core';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { startDemoSite, type DemoSite } from './demoSite';
import { huntByPractice } from './hunt';
import { openBrowser, Visitor, type Size } from './visitor';

/*
 * The first paragraph of what the product promises: a technician signs in, the network goes and the server
 * is stopped, the open contact is found, proven, repaired and recorded; the network comes back and a
 * supervisor accepts it. What is asserted is what a person sees.
 */
let site: DemoSite;
let browser: Browser;
beforeAll(async () => {
  site = await startDemoSite();
  browser = await openBrowser();
});
afterAll(async () => {
  await browser?.close();
  await site?.close();
});

const lifts: Readonly<Record<Size, { readonly name: string; readonly part: RegExp }>> = {
  phone: { name: 'Lift 1', part: /lock contact, landing 5/ },
  desk: { name: 'Lift 2', part: /governor switch/ },
};

describe.each(['phone', 'desk'] as const)('on a %s', (size) => {
  beforeEach(() => site.startServer());

  it('finds, proves and records the open contact with the network off', async () => {
    const technician = await Visitor.open(
      browser,
      site.url,
      size,
      size === 'phone' ? 'dark' : 'light',
    );
    const { page, context } = technician;
    await technician.goto('/sign-in');
    await technician.expectAccessible('sign-in');
    await technician.signIn('jonas@fennimore.example');
    await page.getByRole('heading', { name: 'Saltmarsh House' }).waitFor();
    await technician.expectAccessible('lifts');
    await technician.readyOffline();

    await context.setOffline(true);
    await site.stopServer();
    await page.reload();
    await page.getByText('No signal. Everything you enter is kept on this phone.').waitFor();
    await page.getByRole('link', { name: new RegExp(`^${lifts[size].name}`) }).click();
    await technician.button('Not moving').click();
    await technician.expectAccessible('lift');
    await technician.button('Start a case').click();

    await technician.button('Yes, all safe').click();
    await technician.button('Up').click();
    await technician.button(/^Meter proven/).click();
    await technician.button('Practice: look at all relays').click();
    await technician.expectAccessible('arrive');
    await technician.button('Start finding').click();

    const looked = new Set<string>();
    const readings = await huntByPractice(technician, async (kind) => {
      if (looked.has(kind)) return;
      looked.add(kind);
      await technician.expectAccessible(`find, ${kind}`);
    });
    expect(readings).toBeGreaterThanOrEqual(4);
    await page.getByRole('heading', { name: lifts[size].part }).waitFor();
    await page.getByRole('link', { name: 'State the finding' }).click();

    await page.getByLabel(/^Why\?/).fill('Moved after the last repair; measured 4 mm off');
    await page.getByText('Proven by measurement').waitFor();
    await technician.expectAccessible('finding');
    await technician.button('Record the finding').click();

    await page.getByLabel('What did you do?').fill('Reset, pinned, and checked twice');
    await technician.expectAccessible('repair');
    await technician.button('Record the repair').click();

    await page.getByRole('heading', { name: 'The same points again' }).waitFor();
    await technician.expectAccessible('prove');
    // Closing is refused while something is missing, and says what.
    await page.getByRole('link', { name: /^Close/ }).click();
    await page.getByText('Still needed').waitFor();
    await technician.expectAccessible('close, not ready');
    await page.getByRole('link', { name: /^Prove/ }).click();
    await readAgain(technician);
    await technician
      .button(/^It stopped/)
      .first()
      .click();
    await technician.button(/^Covers and earths on/).click();
    await technician.button('Back in service').click();

    await page.getByText('Nothing is missing.').waitFor();
    await technician.expectAccessible('close');
    await technician.button('Close the case').click();
    await page.getByRole('heading', { name: 'Closed' }).waitFor();
    await page.getByText(/\d+ kept here/).waitFor();

    await page.getByRole('link', { name: /kept here/ }).click();
    await page.getByRole('heading', { name: 'This phone' }).first().waitFor();
    await technician.expectAccessible('this phone');

    await site.startServer();
    await context.setOffline(false);
    await page.getByText('all sent').first().waitFor();
    expect(technician.errors).toEqual([]);

    const supervisor = await Visitor.open(browser, site.url, size, 'light');
    await supervisor.signIn('ruth@fennimore.example');
    await supervisor.page.getByRole('heading', { name: 'To review' }).waitFor();
    const entry = supervisor.page.getByRole('link', { name: lifts[size].part }).filter({
      hasText: 'Practice',
    });
    await entry.waitFor();
    await supervisor.expectAccessible('queue');
    await entry.click();
    await supervisor.page.getByRole('heading', { name: lifts[size].part }).waitFor();
    await supervisor.page.getByText('the proof').waitFor();
    await supervisor.expectAccessible('review');
    await supervisor.button('Accept').click();
    await supervisor.page.getByRole('heading', { name: 'To review' }).waitFor();
    await entry.waitFor({ state: 'detached' });
    expect(supervisor.errors).toEqual([]);
    await supervisor.close();

    await technician.goto('/cases');
    await page.getByRole('heading', { name: 'Accepted' }).waitFor();
    await technician.close();
  });
});

/** Every point that closing asks for, read by the practice lift. */
async function readAgain(technician: Visitor): Promise<void> {
  const putOn = technician.button('Practice: put the probes on');
  for (let point = 0; point < 20; point++) {
    const proving = technician.button(/^It stopped/).first();
    await putOn.or(proving).first().waitFor();
    if (!(await putOn.isVisible())) return;
    const left = await technician.page.locator('.ok').count();
    await putOn.click();
    await technician.page.waitForFunction(
      () => (document.querySelector<HTMLInputElement>('#volts')?.value ?? '') !== '',
    );
    await technician.button('Save').click();
    await technician.page.waitForFunction(
      (before) => document.querySelectorAll('.ok').length > before,
      left,
    );
  }
  throw new Error('The points to read again never end.');
}
