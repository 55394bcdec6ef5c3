// What the browser tests share: a browser, and pages opened in it.
import assert from 'node:assert/strict';
import {readFileSync} from 'node:fs';
import {after, before} from 'node:test';
import {pathToFileURL} from 'node:url';
import {chromium} from 'playwright-core';

export const reports = process.env.REPORTS;
export const TIMEOUT = {timeout: 60000};
// What the pages promise of 5,000 arcs, usable and written.
export const USABLE_MS = 3000;
export const MOST_BYTES = 6e6;
// A machine that builds at the same time is this much slower.
export const PATIENCE = 3;

const axe = readFileSync('node_modules/axe-core/axe.min.js', 'utf8');
const FLAGS = ['--no-sandbox', '--disable-gpu', '--disable-quic',
               '--no-first-run', '--disable-background-networking',
               '--disable-component-update', '--disable-sync'];

export let browser;
before(async () => {
  browser = await chromium.launch(
      {executablePath: process.env.CHROMIUM, args: FLAGS});
});
after(() => browser.close());

// Opens a report and says at the end that it was quiet: nothing on the console,
// nothing asked of a network.
export async function withPage(run, options, body) {
  const context = await browser.newContext(
      {viewport: {width: 1200, height: 900}, ...options});
  const page = await context.newPage();
  const noise = [];
  const address = pathToFileURL(`${reports}/${run}.html`).href;
  page.on('console', message => noise.push(`console: ${message.text()}`));
  page.on('pageerror', error => noise.push(`error: ${error.message}`));
  page.on('dialog', dialog => noise.push(`dialog: ${dialog.message()}`));
  page.on('request', request => {
    if (request.url().split('#')[0] !== address &&
        !request.url().startsWith('data:')) {
      noise.push(`request: ${request.url()}`);
    }
  });
  await page.goto(address + (options.hash ?? ''));
  await body(page);
  assert.deepEqual(noise, []);
  await context.close();
}

export const shownRows = page => page.locator('#arc-table tbody tr');
export const cellTexts = (page, column) => page.$$eval('#arc-table tbody tr',
    (rows, n) => rows.map(row => row.cells[n].textContent.trim()), column);

export async function findsNoViolation(page) {
  await page.evaluate(axe);
  const {violations} = await page.evaluate(() => window.axe.run());
  assert.deepEqual(violations.map(({id, nodes}) =>
      [id, ...nodes.slice(0, 3).map(({html}) => html)]), []);
}
