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
    const record = await scriptsOf(browser, `${base}/patients/${clinic.patientId}`, clinic.cookie, 'h1');
    const first = record.filter((script) => !script.isChart);
    return [
      row('sign-in page, script of the first load', signIn, 130),
      row('record page, script of the first load, charts on demand', first, 190),
      row('record page with its charts', record, 240),
    ];
  } finally {
    await browser.close();
  }
}

interface Script {
  kb: number;
  isChart: boolean;
}

async function scriptsOf(browser: Browser, url: string, cookie: string | null, until: string): Promise<Script[]> {
  const context = await browser.newContext();
  if (cookie) {
    const [name, value] = cookie.split('=');
    await context.addCookies([{ name: name!, value: value!, url }]);
  }
  const page = await context.newPage();
  const scripts: Promise<Script>[] = [];
  page.on('response', (response) => {
    if (new URL(response.url()).pathname.endsWith('.js')) scripts.push(sizeOf(response.url(), response.body()));
  });
  await page.goto(url);
  await page.locator(until).first().waitFor();
  await page.waitForLoadState('load');
  await page.waitForFunction('document.querySelector(\'[aria-busy="true"]\') === null');
  const sizes = await Promise.all(scripts);
  await context.close();
  return sizes;
}

async function sizeOf(url: string, body: Promise<Buffer>): Promise<Script> {
  return { kb: gzipSync(await body, { level: 9 }).length / 1000, isChart: /chart|trend|visx/i.test(url) };
}

function row(what: string, scripts: readonly Script[], limitKb: number): BenchRow {
  const kb = scripts.reduce((sum, script) => sum + script.kb, 0);
  return {
    what,
    measured: `${kb.toFixed(1)} kB gzip`,
    reference: `${scripts.length} files`,
    ratio: kb / limitKb,
    aim: `at most ${limitKb} kB`,
    met: kb <= limitKb,
  };
}
