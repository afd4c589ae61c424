import { AxeBuilder } from '@axe-core/playwright';
import { chromium, type Browser, type BrowserContext, type Page } from 'playwright-core';

/** Debian's Chromium; the flags keep it from looking for hosts of its own. */
export const openBrowser = (): Promise<Browser> =>
  chromium.launch({
    executablePath: process.env['CHROMIUM'] ?? '/usr/bin/chromium',
    args: [
      '--no-sandbox',
      '--disable-gpu',
      '--disable-background-networking',
      '--disable-component-update',
      '--disable-sync',
      '--no-first-run',
    ],
  });

export const sizes = {
  phone: { width: 360, height: 740 },
  desk: { width: 1280, height: 800 },
} as const;
export type Size = keyof typeof sizes;

/** Every wait has a limit, milliseconds. */
const PATIENCE = 20_000;

/** One person at one screen. */
export class Visitor {
  private constructor(
    readonly context: BrowserContext,
    readonly page: Page,
    private readonly url: string,
    /** Errors that the page reported. */
    readonly errors: string[],
  ) {}

  static async open(
    browser: Browser,
    url: string,
    size: Size,
    colorScheme: 'dark' | 'light' = 'dark',
  ): Promise<Visitor> {
    const context = await browser.newContext({
      viewport: sizes[size],
      colorScheme,
      hasTouch: size === 'phone',
      reducedMotion: 'reduce',
    });
    context.setDefaultTimeout(PATIENCE);
    const page = await context.newPage();
    const errors: string[] = [];
    page.on('pageerror', (error) => errors.push(String(error)));
    return new Visitor(context, page, url, errors);
  }

  async signIn(email: string): Promise<void> {
    const { page } = this;
    await page.goto(`${this.url}/sign-in`);
    await page.getByLabel('E-mail address').fill(email);
    await page.getByLabel('Password', { exact: true }).fill('lamp at the end');
    await page.getByRole('button', { name: 'Sign in' }).click();
    await page.waitForURL(({ pathname }) => !pathname.startsWith('/sign-in'));
  }

  async goto(path: string): Promise<void> {
    await this.page.goto(this.url + path);
  }

  button(name: string | RegExp) {
    return this.page.getByRole('button', { name });
  }

  /** What the phone needs without network is on it: the service worker has taken over. */
  async readyOffline(): Promise<void> {
    await this.page.waitForFunction(async () => {
      const registration = await navigator.serviceWorker.getRegistration();
      if (registration?.active?.state !== 'activated') return false;
      const names = await caches.keys();
      const stored = await Promise.all(
        names.map(async (name) => (await (await caches.open(name)).keys()).length),
      );
      return stored.reduce((sum, count) => sum + count, 0) > 20;
    });
  }

  /** axe finds nothing on this screen. */
  async expectAccessible(screen: string): Promise<void> {
    await this.page.getByRole('heading', { level: 1 }).first().waitFor();
    const { violations } = await new AxeBuilder({ page: this.page }).analyze();
    const found = violations.map(({ id, nodes }) => `${screen}: ${id} ${nodes[0]?.html ?? ''}`);
    if (found.length > 0) throw new Error(`axe: ${found.join('; ')}`);
  }

  close(): Promise<void> {
    return this.context.close();
  }
}
