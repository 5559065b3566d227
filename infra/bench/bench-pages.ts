import { gzipSync } from 'node:zlib';
import { chromium, type Browser } from 'playwright-core';
import type { BenchClinic } from './fill-clinic';
import type { BenchRow } from './table';

/** Script of the first load, as a browser fetches it, gzipped. */
export async function benchPages(executablePath: string, base: string, clinic: BenchClinic): Promise<BenchRow[]> {
  const browser = await chromium.launch({
    executablePath,
    args: ['--disable-background-networking', '--disable-quic'],
  });
  try {
    const signIn = await scriptsOf(browser, `${base}/sign-in`, null, 'form');
    const record = await scriptsOf(browser, `${base}/patients/${clinic.patientId}`, clinic.cookie, firstChart);
    return [
      row('sign-in page, script of the first load', signIn, 130),
      row('record page, all script until its first chart stands', record, 190),
    ];
  } finally {
    await browser.close();
  }
}

/** The large chart of the record page, drawn. */
const firstChart = '[aria-label="Trend"] svg [data-mark]';

async function scriptsOf(browser: Browser, url: string, cookie: string | null, until: string): Promise<number[]> {
  const context = await browser.newContext();
  if (cookie) {
    const [name, value] = cookie.split('=');
    // of the whole site: given a page's address the cookie would hold for its folder alone
    await context.addCookies([{ name: name!, value: value!, url: new URL(url).origin }]);
  }
  const page = await context.newPage();
  const scripts: Promise<number>[] = [];
  page.on('response', (response) => {
    if (new URL(response.url()).pathname.endsWith('.js')) scripts.push(sizeOf(response.body()));
  });
  await page.goto(url);
  await page.locator(until).first().waitFor();
  await page.waitForLoadState('load');
  await page.waitForFunction('document.querySelector(\'[aria-busy="true"]\') === null');
  const sizes = await Promise.all(scripts);
  await context.close();
  return sizes;
}

/** In gzip kB. */
async function sizeOf(body: Promise<Buffer>): Promise<number> {
  return gzipSync(await body, { level: 9 }).length / 1000;
}

function row(what: string, scripts: readonly number[], limitKb: number): BenchRow {
  const kb = scripts.reduce((sum, script) => sum + script, 0);
  return {
    what,
    measured: `${kb.toFixed(1)} kB gzip`,
    reference: `${scripts.length} files`,
    ratio: kb / limitKb,
    aim: `at most ${limitKb} kB`,
    met: kb <= limitKb,
  };
}
