// The report page in a browser: see browser_test.sh.
import assert from 'node:assert/strict';
import {statSync} from 'node:fs';
import {test} from 'node:test';
import {pathToFileURL} from 'node:url';
import {
  MOST_BYTES, PATIENCE, TIMEOUT, USABLE_MS, browser, cellTexts,
  findsNoViolation, reports, shownRows, withPage
} from './with_page.mjs';

test('sorts by every column, both ways', TIMEOUT, () =>
  withPage('sample', {}, async page => {
    const values = async () => (await cellTexts(page, 4)).map(parseFloat);
    const head = page.locator('th[data-key="g1"]');
    await head.getByRole('button').click();
    assert.equal(await head.getAttribute('aria-sort'), 'ascending');
    const up = await values();
    const numbers = up.filter(value => !isNaN(value));
    assert.equal(numbers.length, 5);
    assert.deepEqual(numbers, [...numbers].sort((a, b) => a - b));
    assert.ok(up.slice(5).every(isNaN), 'what has no value is last');
    await head.getByRole('button').press('Enter');
    assert.equal(await head.getAttribute('aria-sort'), 'descending');
    const down = await values();
    assert.deepEqual(down.slice(0, 5), [...numbers].sort((a, b) => b - a));
    assert.ok(down.slice(5).every(isNaN), 'what has no value is last');
    for (const key of await page.$$eval('#arc-table th[data-key]',
        heads => heads.map(({dataset}) => dataset.key))) {
      await page.locator(`th[data-key="${key}"] button`).click();
      assert.equal(await page.locator('th[aria-sort]').count(), 1, key);
      assert.equal(await shownRows(page).count(), 7, key);
    }
  }));

test('filters by cell, corner, edge and verdict', TIMEOUT, () =>
  withPage('sample', {}, async page => {
    const CASES = [
      [{cell: 'NAND'}, 4], [{cell: 'inv'}, 2], [{cell: 'no such'}, 0],
      [{edge: 'rise'}, 4], [{edge: 'fall'}, 3], [{verdict: 'within'}, 2],
      [{verdict: 'beyond'}, 2], [{verdict: 'not measured'}, 3],
      [{verdict: 'bent'}, 2], [{corner: 'slow_lo_m40'}, 1],
      [{cell: 'nand', edge: 'fall', verdict: 'beyond'}, 1],
    ];
    for (const [filter, count] of CASES) {
      await page.getByRole('button', {name: 'Show all'}).click();
      await page.waitForFunction(() =>
          document.querySelectorAll('#arc-table tbody tr').length === 7);
      for (const [name, value] of Object.entries(filter)) {
        const control = page.locator(`#filter-${name}`);
        await (name === 'cell' ? control.fill(value)
                               : control.selectOption({label: value}));
      }
      const what = JSON.stringify(filter);
      assert.equal(await shownRows(page).count(), count, what);
      assert.equal(await page.locator('#arc-count').textContent(),
          `${count} of 7 arcs`, what);
    }
  }));

test('leads from arcs to their pictures', TIMEOUT, () =>
  withPage('hostile', {}, async page => {
    const links = page.locator('a[href="#arc-3"]');
    assert.ok(await links.count() >= 3, 'table, map and cell');
    await page.locator('#arc-table a[href="#arc-3"]').click();
    const picture = page.locator('#picture-3');
    await picture.waitFor();
    assert.ok(await picture.evaluate(
        shown => shown === document.activeElement), 'has the focus');
    await picture.locator('svg').waitFor();
    // Five points, each in the picture's own table.
    await picture.locator('summary').click();
    assert.equal(await picture.locator('tbody tr').count(), 5);
    const [fanout, delay, , fitted] =
        await picture.locator('tbody tr').nth(1).locator('th, td')
            .allTextContents();
    assert.equal(fanout, '2');
    assert.equal(delay, fitted);  // The run's points lie on its lines.
    // Not measured: said in words.
    await page.locator('#arc-table a[href="#arc-13"]').click();
    assert.match(await page.locator('#picture-13').textContent(),
        /not measured.*No point was measured\./s);
  }));

test('opens at an arc', TIMEOUT, () =>
  withPage('hostile', {hash: '#arc-5'}, async page => {
    await page.locator('#picture-5 svg').waitFor();
  }));

test('draws every arc that has a number', TIMEOUT, () =>
  withPage('sample', {}, async page => {
    const charts = page.locator('#difference-charts .chart');
    assert.equal(await charts.count(), 2);
    await charts.first().scrollIntoViewIfNeeded();
    await charts.first().locator('svg').waitFor();
    const label = await charts.first().getAttribute('aria-label');
    assert.match(label, /2 arcs within, 2 beyond, 3 not measured/);
    assert.match(await charts.first().textContent(),
        /allowed \+25.%.*below: not measured, at the hand number/s);
  }));

test('says all of it without scripts', TIMEOUT, () =>
  withPage('large', {javaScriptEnabled: false}, async page => {
    assert.equal(await shownRows(page).count(), 5000);
    assert.ok(await page.locator('#arc-5000').isVisible());
    assert.ok(!await page.locator('#filters').isVisible());
  }));

test('keeps hostile names inert and readable', TIMEOUT, () =>
  withPage('hostile', {}, async page => {
    const NAME = '</script><img src=x onerror="document.title=\'broken\'">';
    assert.match(await page.title(), /^<\/title><script>/);
    assert.equal(await page.locator('img').count(), 0);
    assert.equal(await page.locator('script').count(), 3);
    for (const name of [NAME, 'w'.repeat(200), '\u0628\u0648\u0627\u0628\u0629',
                        '\u53cd\u53ca\u9598', '{{data}}<!--']) {
      const cells = await cellTexts(page, 0);
      assert.equal(cells.filter(cell => cell === name).length,
          name === NAME ? 3 : 2, name);
    }
    await page.locator('#picture-cell').selectOption('0');
    await page.locator('#picture-1').scrollIntoViewIfNeeded();
    await page.locator('#picture-1 svg').waitFor();
    assert.match(await page.locator('#picture-1').textContent(),
        /<img src=x onerror/);
    for (const width of [1200, 390]) {
      await page.setViewportSize({width, height: 900});
      assert.equal(await page.evaluate(() =>
          document.documentElement.scrollWidth - innerWidth), 0,
          `no sideways scrolling at ${width} px`);
    }
  }));

test('lets no other script run', TIMEOUT, async () => {
  const context = await browser.newContext();
  const page = await context.newPage();
  await page.goto(pathToFileURL(`${reports}/sample.html`).href);
  await page.evaluate(() => {
    const script = document.createElement('script');
    script.textContent = 'document.title = "broken"';
    document.body.append(script);
    document.body.insertAdjacentHTML('beforeend',
        '<img src="data:," onerror="document.title = \'broken\'">');
  });
  await page.waitForTimeout(200);
  assert.doesNotMatch(await page.title(), /broken/);
  await context.close();
});

test('prints light, with pictures, whatever the screen', TIMEOUT, () =>
  withPage('sample', {colorScheme: 'dark'}, async page => {
    await page.evaluate(() => addEventListener('beforeprint', () => {
      const charts = [...document.querySelectorAll('.chart')];
      window.atPrint = {
        charts: charts.length,
        drawn: charts.filter(chart => chart.querySelector('svg path')).length,
        width: charts[0].querySelector('svg').getAttribute('width'),
        dark: charts[0].innerHTML.includes('#e7e9ee'),
        plan: document.getElementById('plan').open,
      };
    }));
    const pdf = await page.pdf({preferCSSPageSize: true});
    const atPrint = await page.evaluate(() => window.atPrint);
    assert.ok(atPrint.charts >= 2);
    assert.deepEqual(atPrint, {charts: atPrint.charts, drawn: atPrint.charts,
                               width: '690', dark: false, plan: true});
    assert.equal(pdf.subarray(0, 5).toString(), '%PDF-');
  }));

for (const [name, run, options] of [
  ['light', 'sample', {colorScheme: 'light'}],
  ['dark', 'sample', {colorScheme: 'dark'}],
  ['390 px wide', 'sample', {viewport: {width: 390, height: 800}}],
  ['hostile', 'hostile', {}],
  ['exemptions, dark', 'exempt', {colorScheme: 'dark'}],
  ['exemptions, 390 px wide', 'exempt', {viewport: {width: 390, height: 800}}],
  ['empty', 'empty', {}],
]) {
  test(`axe finds nothing: ${name}`, TIMEOUT, () =>
    withPage(run, options, findsNoViolation));
}

test('holds 5,000 arcs', TIMEOUT, () =>
  withPage('large', {}, async page => {
    assert.ok(statSync(`${reports}/large.html`).size < MOST_BYTES);
    const loaded = await page.evaluate(() =>
        performance.getEntriesByType('navigation')[0].loadEventEnd);
    const start = performance.now();
    await page.locator('#filter-cell').fill('gate_77');
    await page.locator('#filter-verdict').selectOption('beyond');
    const text = await page.locator('#arc-count').textContent();
    const filtered = performance.now() - start;
    await page.locator('#difference-charts .chart svg').first().waitFor();
    console.log(`5,000 arcs: loaded in ${Math.round(loaded)} ms, filtered in ` +
                `${Math.round(filtered)} ms`);
    assert.match(text, /^\d+ of 5000 arcs$/);
    assert.ok(loaded < PATIENCE * USABLE_MS, `loaded in ${loaded} ms`);
    await page.getByRole('button', {name: 'Show all'}).click();
    await page.getByRole('button', {name: 'Show more rows'}).click();
    assert.equal(await shownRows(page).count(), 400);
    assert.equal(await page.locator('#arc-count').textContent(),
        '5000 arcs; the first 400 are shown');
  }));
