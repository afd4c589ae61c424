import type { Browser } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { clientFolder } from '../../api/local/build';
import { startDemoSite, type DemoSite } from './demoSite';
import { writePseudoLocale } from './pseudoLocale';
import { CLOSE, OPEN, PSEUDO_LOCALE } from './pseudoText';
import { openBrowser, Visitor } from './visitor';

/* Every text of a screen is in brackets, or is data: what is not was never marked for translation. */
let site: DemoSite;
let browser: Browser;
beforeAll(async () => {
  site = await startDemoSite();
  writePseudoLocale(clientFolder);
  browser = await openBrowser();
});
afterAll(async () => {
  await browser?.close();
  await site?.close();
});

/** Texts of the page outside brackets that have a word of English in them. */
const unmarked = (visitor: Visitor, data: readonly string[]): Promise<string[]> =>
  visitor.page.evaluate(
    ({ open, close, known }) => {
      const walker = document.createTreeWalker(document.body, NodeFilter.SHOW_TEXT);
      const found = new Set<string>();
      for (let node = walker.nextNode(); node; node = walker.nextNode()) {
        const parent = node.parentElement;
        if (!parent?.checkVisibility() || !node.textContent?.trim()) continue;
        // Whole sentences are bracketed around their values: take the block, without what is marked.
        const block = parent.closest('[data-pseudo-data]') ?? parent;
        let text = block.textContent ?? '';
        const marked = new RegExp(`${open}[^${close}]*${close}`, 'g');
        while (marked.test(text)) text = text.replace(marked, ' ');
        for (const value of known) text = text.replaceAll(value, ' ');
        text = text.replace(new RegExp(`[${open}${close}]`, 'g'), ' ').trim();
        if (/[A-Za-z]{4,}/.test(text)) found.add(text.slice(0, 80));
      }
      return [...found];
    },
    { open: OPEN, close: CLOSE, known: [...data] },
  );

describe('the pseudo-locale', () => {
  it('leaves no text unmarked on sign-in, cases, this phone and not found', async () => {
    const visitor = await Visitor.open(browser, site.url, 'phone');
    const { page } = visitor;
    await page.addInitScript(
      ([key, value]) => localStorage.setItem(key!, value!),
      ['lampline.locale', PSEUDO_LOCALE],
    );
    await visitor.goto('/sign-in');
    await page.getByText(OPEN).first().waitFor();
    expect(await unmarked(visitor, [])).toEqual([]);
    await page.locator('#email').fill('adaeze@fennimore.example');
    await page.locator('#password').fill('lamp at the end');
    await page.locator('button[type=submit]').click();
    await page.waitForURL(/lifts/);
    await visitor.goto('/nothing-here');
    await page.locator('.notice').waitFor();
    expect(await unmarked(visitor, ['Adaeze Brook', 'Fennimore & Daughters Lifts'])).toEqual([]);
    await visitor.close();
  });
});
