import type { Browser } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { startDemoSite, type DemoSite } from './demoSite';
import { openBrowser, Visitor } from './visitor';

/* What a person sees when what they type can't be right: a sentence, and what they typed is still there. */
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

describe('what is typed wrong', () => {
  it('on the sign-in page is said beside the field', async () => {
    const visitor = await Visitor.open(browser, site.url, 'phone');
    const { page } = visitor;
    await visitor.goto('/sign-in');
    await page.getByLabel('E-mail address').fill('not an address');
    await visitor.button('Sign in').click();
    await page.getByText('An address with an @ in it').waitFor();
    await page.getByText('Your password, please.').waitFor();
    await page.getByLabel('E-mail address').fill('jonas@fennimore.example');
    await page.getByLabel('Password', { exact: true }).fill('not the password');
    await visitor.button('Sign in').click();
    await page.getByText('E-mail address and password do not belong together.').waitFor();
    expect(await page.getByLabel('E-mail address').inputValue()).toBe('jonas@fennimore.example');
    await visitor.close();
  });

  it('on the pad keeps the digits: nonsense, 1e9 volts, a comma, swapped probes', async () => {
    const visitor = await Visitor.open(browser, site.url, 'phone');
    const { page } = visitor;
    await visitor.signIn('jonas@fennimore.example');
    await page.getByRole('link', { name: /^Lift 2/ }).click();
    await visitor.button('Start a case').click();
    await page.getByText('Say in a few words what is wrong').waitFor();
    await visitor.button('Not moving').click();
    await visitor.button('Start a case').click();
    await visitor.button('Start finding').click();
    await page.getByText('All three come before the first reading.').waitFor();
    await visitor.button('Yes, all safe').click();
    await visitor.button('Up').click();
    await visitor.button(/^Meter proven/).click();
    await visitor.button('Practice: look at all relays').click();
    await visitor.button('Start finding').click();
    await visitor.button('Understood').click();

    const volts = page.getByLabel('Reading in volts');
    const save = visitor.button('Save');
    await volts.fill('about fifty');
    await page.getByText(/no number/).waitFor();
    // Said to be disabled, and touched all the same.
    await save.click({ force: true });
    expect(await volts.inputValue()).toBe('about fifty');
    await volts.fill('1e9');
    await page.getByText(/More than any lift's circuit carries/).waitFor();
    await save.click({ force: true });
    expect(await volts.inputValue()).toBe('1e9');
    await volts.fill('-110,3');
    await page.getByText(/swapped/).waitFor();
    await save.click();
    // Taken as it stands: the lamp of the first tag is lit.
    await page.getByRole('button', { name: /behind the fuse, live/ }).waitFor();
    expect(visitor.errors).toEqual([]);
    await visitor.close();
  });

  it('in a circuit has findings in words, while one types', async () => {
    const visitor = await Visitor.open(browser, site.url, 'desk', 'light');
    const { page } = visitor;
    await visitor.signIn('tove@fennimore.example');
    await visitor.goto('/circuits/check');
    const field = page.getByLabel('Circuit as JSON');
    await field.fill('{"parts": ');
    await page.getByText("This can't be read as JSON").waitFor();
    await field.fill('{"parts": 7}');
    await page
      .getByText(/This is not a circuit/)
      .first()
      .waitFor();
    expect(await field.inputValue()).toBe('{"parts": 7}');
    await visitor.expectAccessible('check a circuit');
    await visitor.close();
  });
});
