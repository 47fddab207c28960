/** Pages in Chromium: what a browser makes of them, whether they keep to their own policy, and whether they are
 *  accessible. Where there is no Chromium the test is skipped and says so; under CI that is a failure. */

import { existsSync, readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import { type Browser, chromium } from 'playwright-core';
import { breachesOf } from './html-rules.ts';
import { parseStrictly, tagsOf } from './html-tree.ts';

const executablePath = process.env.CHROMIUM ?? '/usr/bin/chromium';
const axeSource = readFileSync(createRequire(import.meta.url).resolve('axe-core/axe.min.js'), 'utf8');

/** Whether tests in a browser are to be skipped. Says so once. */
export function isBrowserMissing(): boolean {
  if (existsSync(executablePath)) return false;
  if ((process.env.CI ?? '') !== '') throw new Error(`CI needs Chromium at ${executablePath}`);
  console.warn(`skipped: no Chromium at ${executablePath} (set CHROMIUM to its path)`);
  return true;
}

export function openBrowser(): Promise<Browser> {
  return chromium.launch({
    executablePath,
    args: [
      '--no-sandbox',
      '--disable-gpu',
      '--disable-quic',
      '--no-first-run',
      '--disable-background-networking',
      '--disable-component-update',
      '--disable-sync',
    ],
  });
}

export interface Examination {
  /** Breaches of the page's own content security policy. */
  policy: string[];
  /** Addresses that the page asked for. */
  requests: string[];
  /** Where the browser read other elements than stand in the file: errors that it repaired. */
  repairs: string[];
  /** Breaches of `html-rules.ts`. */
  structure: string[];
  /** Violations that axe-core finds, with the element. */
  accessibility: string[];
  /** Wider than a window of 1280 pixels, or of 360 as on a telephone. */
  overflow: string[];
}

/** Nothing found is good: every list is empty. @throws {Error} HTML that is not well formed */
export async function examinePage(browser: Browser, html: string): Promise<Examination> {
  const tree = parseStrictly(html);
  const context = await browser.newContext({ viewport: { width: 1280, height: 900 } });
  try {
    const page = await context.newPage();
    const address = 'http://page.invalid/';
    const requests: string[] = [];
    await page.route('**/*', (route) => {
      if (route.request().url() === address) return route.fulfill({ body: html, contentType: 'text/html' });
      requests.push(route.request().url());
      return route.abort();
    });
    await page.addInitScript(
      'window.breaches = []; addEventListener("securitypolicyviolation", ({ violatedDirective, blockedURI, sample }) => breaches.push([violatedDirective, blockedURI, sample].join(" ")))',
    );
    await page.goto(address);
    const policy = (await page.evaluate('breaches')) as string[];
    const serialised = (await page.evaluate('document.documentElement.outerHTML')) as string;
    const overflow = await overflowAt(page, [1280, 360]);
    await page.evaluate(axeSource);
    const found = (await page.evaluate('axe.run()')) as {
      violations: { id: string; help: string; nodes: { html: string }[] }[];
    };
    return {
      policy,
      requests: requests.filter((url) => !url.endsWith('/favicon.ico')),
      repairs: differences(tagsOf(tree), tagsOf(parseStrictly(`<!doctype html>\n${serialised}`))),
      structure: breachesOf(tree),
      accessibility: found.violations.flatMap(({ id, help, nodes }) =>
        nodes.map((node) => `${id}: ${help}: ${node.html.slice(0, 120)}`),
      ),
      overflow,
    };
  } finally {
    await context.close();
  }
}

/** An examination that found nothing. */
export const NOTHING_FOUND: Examination = {
  policy: [],
  requests: [],
  repairs: [],
  structure: [],
  accessibility: [],
  overflow: [],
};

async function overflowAt(
  page: {
    setViewportSize(size: { width: number; height: number }): Promise<void>;
    evaluate(code: string): Promise<unknown>;
  },
  widths: readonly number[],
): Promise<string[]> {
  const found: string[] = [];
  for (const width of widths) {
    await page.setViewportSize({ width, height: 900 });
    const needed = await page.evaluate('document.documentElement.scrollWidth');
    if (Number(needed) > width) found.push(`${needed} px wide in a window of ${width} px`);
  }
  await page.setViewportSize({ width: 1280, height: 900 });
  return found;
}

function differences(written: readonly string[], read: readonly string[]): string[] {
  const at = written.findIndex((tag, index) => tag !== read[index]);
  if (at >= 0) return [`written '${written[at]}', read '${read[at]}'`];
  return read.length > written.length ? [`read '${read[written.length]}' beyond the end`] : [];
}
