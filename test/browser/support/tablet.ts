import { lstatSync, readlinkSync } from 'node:fs';
import { join } from 'node:path';
import { chromium, type BrowserContext, type Page, type ViewportSize } from '@playwright/test';
import { chromiumPath, chromiumSwitches } from './chromium';

/** What a tablet is launched with. */
export interface TabletOptions {
  /** The folder that keeps all that the browser stores; the same folder is the same tablet. */
  readonly userDataDir: string;
  readonly viewport?: ViewportSize;
  /** The product's address, for `page.goto('/')`. */
  readonly baseUrl?: string;
  /** More switches, as for a fake microphone. */
  readonly switches?: readonly string[];
}

/** A Chromium with a profile of its own, as it runs on one tablet. */
export interface Tablet {
  readonly context: BrowserContext;
  readonly page: Page;
  /** Puts it away in order. */
  close(): Promise<void>;
  /** Ends the browser's process at once, as an empty battery would; nothing is written any more. */
  kill(): Promise<void>;
}

/** Switches a tablet on. Launched again with the same folder it finds what it had stored. */
export async function launchTablet(options: TabletOptions): Promise<Tablet> {
  const context = await chromium.launchPersistentContext(options.userDataDir, {
    executablePath: chromiumPath,
    headless: true,
    args: [...chromiumSwitches, ...(options.switches ?? [])],
    viewport: options.viewport ?? { width: 1280, height: 800 },
    locale: 'en-GB',
    timezoneId: 'UTC',
    ...(options.baseUrl === undefined ? {} : { baseURL: options.baseUrl }),
  });
  context.setDefaultTimeout(20_000);
  const page = context.pages()[0] ?? (await context.newPage());
  return {
    context,
    page,
    close: () => context.close(),
    kill: async () => {
      const closed = context.waitForEvent('close');
      process.kill(browserProcess(options.userDataDir), 'SIGKILL');
      await closed;
    },
  };
}

/** The browser's process, read from the lock that Chromium keeps in its profile: a link to `<host>-<process id>`. */
function browserProcess(userDataDir: string): number {
  const lock = join(userDataDir, 'SingletonLock');
  lstatSync(lock);
  return Number(readlinkSync(lock).split('-').at(-1));
}
