import { findChromium } from '../debian.mjs';
import { Browser } from './browser.mjs';

const PHONE = { width: 390, height: 844 };

/**
 * Opens the sign-in page and then a circuit in a real browser, and notes which scripts each of them loaded.
 * @param {import('../shutdown.mjs').Shutdown} shutdown
 * @param {{ port: number, seeded: import('./seed.mjs').Seeded }} context
 * @returns {Promise<{ signIn: Set<string>, circuit: Set<string> } | null>} file names, until the page shows its
 *   content; those of the circuit without those of the sign-in page. Null without a browser
 */
export async function visitPages(shutdown, { port, seeded }) {
  const executablePath = findChromium();
  if (!executablePath) {
    return null;
  }
  const { chromium } = await import('playwright-core');
  const browser = await chromium.launch({ executablePath, args: ['--no-sandbox'] });
  shutdown.add('The browser', () => browser.close());
  const url = `http://127.0.0.1:${port}`;
  const context = await browser.newContext({ viewport: PHONE, serviceWorkers: 'block', locale: 'en-US' });
  const loaded = /** @type {Set<string>} */ (new Set());
  context.on('request', (request) => {
    const name = new URL(request.url()).pathname.slice(1);
    if (name.endsWith('.js')) loaded.add(name);
  });
  const page = await context.newPage();
  await page.goto(`${url}/sign-in`);
  await page.waitForSelector('input[type=email]', { state: 'visible', timeout: 30_000 });
  const signIn = new Set(loaded);
  const session = new Browser(port);
  await session.signIn(seeded.installer.email, seeded.installer.password);
  session.close();
  await context.addCookies([...session.cookies].map(([name, value]) => ({ name, value, url })));
  loaded.clear();
  await page.goto(`${url}/work/${seeded.quiet.sequences[0].id}`);
  await page.waitForSelector('h1', { state: 'visible', timeout: 30_000 });
  await page.waitForLoadState('networkidle');
  const circuit = new Set([...loaded].filter((name) => !signIn.has(name)));
  await context.close();
  await browser.close();
  return { signIn, circuit };
}
