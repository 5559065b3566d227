import { gzipSync } from 'node:zlib';
import { chromium, type Browser, type Request } from 'playwright-core';
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
      row('record page, first load, its charts on demand', record.slice(0, chartsFrom(record)), 190),
      row('record page with its first chart', record, null),
    ];
  } finally {
    await browser.close();
  }
}

/** The drawing code is asked for by this module, on demand; what is requested before it is the first load. */
const chartsModule = /\/summary-charts-[^/]*\.js$/;

function chartsFrom(scripts: readonly Script[]): number {
  const at = scripts.findIndex(({ path }) => chartsModule.test(path));
  if (at === -1) throw new Error('The record page asked for no drawing code: has the module been renamed?');
  return at;
}

interface Script {
  path: string;
  /** In gzip kB. */
  kb: number;
}

/** The large chart of the record page, drawn. */
const firstChart = '[aria-label="Trend"] svg [data-mark]';

async function scriptsOf(browser: Browser, url: string, cookie: string | null, until: string): Promise<Script[]> {
  const context = await browser.newContext();
  if (cookie) {
    const [name, value] = cookie.split('=');
    // of the whole site: given a page's address the cookie would hold for its folder alone
    await context.addCookies([{ name: name!, value: value!, url: new URL(url).origin }]);
  }
  const page = await context.newPage();
  const requests: Request[] = [];
  page.on('request', (request) => {
    if (new URL(request.url()).pathname.endsWith('.js')) requests.push(request);
  });
  await page.goto(url);
  await page.locator(until).first().waitFor();
  await page.waitForLoadState('load');
  await page.waitForFunction('document.querySelector(\'[aria-busy="true"]\') === null');
  const sizes = await Promise.all(requests.map(sizeOf));
  await context.close();
  return sizes;
}

async function sizeOf(request: Request): Promise<Script> {
  const response = await request.response();
  if (!response) throw new Error(`${request.url()} got no answer`);
  const kb = gzipSync(await response.body(), { level: 9 }).length / 1000;
  return { path: new URL(request.url()).pathname, kb };
}

function row(what: string, scripts: readonly Script[], limitKb: number | null): BenchRow {
  const kb = scripts.reduce((sum, script) => sum + script.kb, 0);
  return {
    what,
    measured: `${kb.toFixed(1)} kB gzip`,
    reference: `${scripts.length} files`,
    ratio: limitKb === null ? null : kb / limitKb,
    aim: limitKb === null ? 'none set' : `at most ${limitKb} kB`,
    met: limitKb === null || kb <= limitKb,
  };
}
