import { mkdirSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import AxeBuilder from '@axe-core/playwright';
import { type Browser, type BrowserContext, chromium, type Page } from 'playwright-core';
import { expect, onTestFailed } from 'vitest';
import type { DemonstrationAccount, RunningApp } from './running-app.ts';

const pictures = fileURLToPath(new URL('../../.data/pictures', import.meta.url));

export const screens = [
  { name: 'phone', width: 390, height: 844 },
  { name: 'wide', width: 1440, height: 900 },
] as const;
export type Screen = (typeof screens)[number];

export function openBrowser(): Promise<Browser> {
  return chromium.launch({
    executablePath: '/usr/bin/chromium',
    args: [
      ...['--headless', '--no-sandbox', '--disable-gpu', '--disable-quic', '--no-first-run'],
      ...['--disable-background-networking', '--disable-component-update', '--disable-sync'],
    ],
  });
}

// A person signs in once and comes back with their cookie: sign-ins are limited to ten a minute.
const sessions = new Map<string, Awaited<ReturnType<BrowserContext['storageState']>>>();

async function signIn(page: Page, { address }: RunningApp, { email, password }: DemonstrationAccount): Promise<void> {
  await page.goto(`${address}/sign-in`);
  await page.getByLabel('E-mail address').fill(email);
  await page.getByLabel('Password', { exact: true }).fill(password);
  await page.getByRole('button', { name: 'Sign in' }).click();
}

/** One person at one screen, signed in unless nobody is named. Errors of the page fail the test that caused them. */
export class Visitor {
  readonly faults: string[] = [];
  private constructor(
    readonly context: BrowserContext,
    readonly page: Page,
    readonly app: RunningApp,
    readonly screen: Screen,
    /** The address of the firm. */
    readonly firm: string,
    /** For signatures, which ask for it again. */
    readonly password: string,
  ) {}

  static async arrive(browser: Browser, app: RunningApp, screen: Screen, role: DemonstrationAccount['role'] | null): Promise<Visitor> {
    const account = app.accounts.find((candidate) => candidate.role === role);
    const key = `${app.address} ${role}`;
    const session = sessions.get(key);
    const viewport = { width: screen.width, height: screen.height };
    const context = await browser.newContext({ viewport, reducedMotion: 'reduce', ...(session ? { storageState: session } : {}) });
    const page = await context.newPage();
    page.setDefaultTimeout(30_000);
    let firm = '';
    if (account) {
      await (session ? page.goto(`${app.address}/`) : signIn(page, app, account));
      await page.waitForURL(/\/[0-9a-f-]{36}\//);
      sessions.set(key, await context.storageState());
      firm = `/${new URL(page.url()).pathname.split('/')[1]}`;
    }
    const visitor = new Visitor(context, page, app, screen, firm, account?.password ?? '');
    page.on('pageerror', (error) => visitor.faults.push(error.message));
    onTestFailed(({ task }) => visitor.keepPicture(`failed ${task.name}`));
    return visitor;
  }

  async open(path: string): Promise<void> {
    await this.page.goto(this.app.address + path);
  }

  /** Waits for the title, keeps a picture, and finds nothing that shuts anybody out (axe, WCAG 2.2 AA and best practice). */
  async sees(title: string | RegExp): Promise<void> {
    const heading = this.page.getByRole('heading', { level: 1, name: title });
    await heading.waitFor();
    await this.page.getByText('Loading').waitFor({ state: 'detached' });
    await this.keepPicture(String(title));
    const { violations } = await new AxeBuilder({ page: this.page }).analyze();
    expect(violations.map(({ id, nodes }) => `${id}: ${nodes.map(({ html }) => html).join(' ')}`)).toEqual([]);
    const sideways = await this.page.evaluate(() => document.documentElement.scrollWidth - document.documentElement.clientWidth);
    expect(sideways, 'the page scrolls sideways').toBeLessThanOrEqual(0);
  }

  /** A picture of the whole page, to be looked at. */
  async keepPicture(name: string): Promise<void> {
    mkdirSync(pictures, { recursive: true });
    const file = `${name.replace(/\W+/g, '-').replace(/^-/, '')}-${this.screen.name}.png`;
    await this.page.screenshot({ path: `${pictures}/${file}`, fullPage: true });
  }

  /** A request from the page itself, with its cookie and origin. */
  async send(method: string, path: string, body: unknown): Promise<unknown> {
    const reply = await this.page.evaluate(
      async ({ method, path, body }) => {
        const answer = await fetch(`/api/v1/firms${path}`, {
          method,
          headers: { 'content-type': 'application/json' },
          body: JSON.stringify(body),
        });
        return { status: answer.status, json: await answer.json() };
      },
      { method, path: this.firm + path, body },
    );
    expect(reply.status, JSON.stringify(reply.json)).toBeLessThan(300);
    return reply.json;
  }

  async leave(): Promise<void> {
    expect(this.faults).toEqual([]);
    await this.context.close();
  }
}
