import { chromium, type Browser, type BrowserContext, type Page } from 'playwright-core';
import { PASSWORD } from '../../backend/src/testing/test-client';

export const PHONE = { width: 390, height: 844 };
export const LAPTOP = { width: 1280, height: 800 };

/** One browser for a whole spec, and everything that any page complained of in its console. */
export class TestBrowser {
  readonly complaints: string[] = [];

  private constructor(
    private readonly browser: Browser,
    private readonly url: string,
  ) {}

  static async launch(url: string): Promise<TestBrowser> {
    const browser = await chromium.launch({
      executablePath: process.env['CHROMIUM_PATH'] ?? '/usr/bin/chromium',
      args: [
        '--no-sandbox',
        '--disable-gpu',
        '--disable-quic',
        '--disable-background-networking',
        '--no-first-run',
      ],
    });
    return new TestBrowser(browser, url);
  }

  /** A new device: nothing is shared with any other. */
  async device(viewport: { width: number; height: number }, locale = 'en-US'): Promise<BrowserContext> {
    const context = await this.browser.newContext({
      viewport,
      locale,
      baseURL: this.url,
      hasTouch: viewport.width < 600,
    });
    context.setDefaultTimeout(15_000);
    context.on('page', (page) => this.listen(page));
    return context;
  }

  /** Signs in on a page of the device, as a person does. */
  async signIn(device: BrowserContext, email: string, path = '/'): Promise<Page> {
    const page = await device.newPage();
    await page.goto(path);
    await page.getByLabel('Email').fill(email);
    await page.getByLabel('Password', { exact: true }).fill(PASSWORD);
    await page.getByRole('button', { name: 'Sign in' }).click();
    await page.waitForURL((url) => !url.pathname.startsWith('/sign-in'));
    return page;
  }

  async close(): Promise<void> {
    await this.browser.close();
  }

  private listen(page: Page): void {
    page.on('console', (message) => {
      if (message.type() === 'error' || message.type() === 'warning') {
        this.complaints.push(`${message.type()}: ${message.text()} (${page.url()})`);
      }
    });
    page.on('pageerror', (error) => this.complaints.push(`${error.message} (${page.url()})`));
  }
}

/** Draws a scrawl into the signature box. */
export async function drawSignature(page: Page): Promise<void> {
  const canvas = page.locator('app-signature-box canvas');
  await canvas.scrollIntoViewIfNeeded();
  const box = await canvas.boundingBox();
  if (!box) throw new Error('No signature box');
  await page.mouse.move(box.x + 30, box.y + box.height / 2);
  await page.mouse.down();
  for (let index = 1; index <= 12; index += 1) {
    const lift = index % 2 === 0 ? 14 : -16;
    await page.mouse.move(box.x + 30 + index * 14, box.y + box.height / 2 + lift, { steps: 2 });
  }
  await page.mouse.up();
}
