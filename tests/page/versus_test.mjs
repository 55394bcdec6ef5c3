// The page of two runs in a browser: see browser_test.sh.
import assert from 'node:assert/strict';
import {statSync} from 'node:fs';
import {test} from 'node:test';
import {
  MOST_BYTES, PATIENCE, TIMEOUT, USABLE_MS, cellTexts, findsNoViolation,
  reports, shownRows, withPage
} from './with_page.mjs';

// "-13 % ±1.2 %" is -13; nothing is NaN.
const changes = async page => (await cellTexts(page, 5)).map(parseFloat);

test('sorts by every column, both ways', TIMEOUT, () =>
  withPage('versus/sample', {}, async page => {
    const head = page.locator('#arc-table th[data-key="g2"]');
    await head.getByRole('button').click();
    assert.equal(await head.getAttribute('aria-sort'), 'ascending');
    const up = await changes(page);
    const numbers = up.filter(value => !isNaN(value));
    assert.equal(numbers.length, 5);
    assert.deepEqual(numbers, [...numbers].sort((a, b) => a - b));
    assert.ok(up.slice(5).every(isNaN), 'what has no value is last');
    await head.getByRole('button').press('Enter');
    const down = await changes(page);
    assert.deepEqual(down.slice(0, 5), [...numbers].sort((a, b) => b - a));
    for (const key of await page.$$eval('#arc-table th[data-key]',
        heads => heads.map(({dataset}) => dataset.key))) {
      await page.locator(`#arc-table th[data-key="${key}"] button`).click();
      assert.equal(await page.locator('th[aria-sort]').count(), 1, key);
      assert.equal(await shownRows(page).count(), 6, key);
    }
  }));

test('filters by cell, corner, edge and finding', TIMEOUT, () =>
  withPage('versus/sample', {}, async page => {
    const CASES = [
      [{cell: 'NAND'}, 3], [{cell: 'no such'}, 0], [{corner: 'typical'}, 6],
      [{edge: 'rise'}, 3], [{edge: 'fall'}, 3],
      [{finding: 'not measured'}, 1], [{finding: 'same jobs'}, 0],
    ];
    const findings = await cellTexts(page, 9);
    const changed = findings.filter(text => text.startsWith('changed'));
    CASES.push([{finding: 'changed'}, changed.length],
               [{finding: 'verdicts differ'},
                findings.filter(text => / in A, .* in B/.test(text)).length]);
    assert.ok(changed.length > 0);
    for (const [filter, count] of CASES) {
      await page.getByRole('button', {name: 'Show all'}).click();
      await page.waitForFunction(() =>
          document.querySelectorAll('#arc-table tbody tr').length === 6);
      for (const [name, value] of Object.entries(filter)) {
        const control = page.locator(`#filter-${name}`);
        await (name === 'cell' ? control.fill(value)
                               : control.selectOption({label: value}));
      }
      const what = JSON.stringify(filter);
      assert.equal(await shownRows(page).count(), count, what);
      assert.equal(await page.locator('#arc-count').textContent(),
          count === 6 ? '6 arcs' : `${count} of 6 arcs`, what);
    }
  }));

test('draws every change, and leads to the table', TIMEOUT, () =>
  withPage('versus/hostile', {}, async page => {
    const drawn = page.locator('.chart');
    assert.equal(await drawn.count(), 3);
    for (const chart of await drawn.all()) {
      await chart.scrollIntoViewIfNeeded();
      await chart.locator('svg').waitFor();
      assert.match(await chart.textContent(), /\+10.%/);
    }
    assert.match(await drawn.nth(1).getAttribute('aria-label'),
        /effort g from A to B against its size in A: \d+ of 12 arcs within/);
    // Twelve marks and an arc's tooltip: marks are the only filled triangles.
    const marks = await drawn.nth(1).locator('svg path[fill-opacity]').all();
    assert.ok(marks.length >= 12, `${marks.length} marks`);
    await marks[0].click({force: true});
    await page.waitForFunction(() =>
        document.getElementById('filter-cell').value !== '');
    assert.equal(await shownRows(page).count(), 2);
  }));

test('says all of it without scripts', TIMEOUT, () =>
  withPage('versus/large', {javaScriptEnabled: false}, async page => {
    assert.equal(await shownRows(page).count(), 4999);
    assert.ok(await shownRows(page).last().isVisible());
    assert.ok(!await page.locator('#filters').isVisible());
  }));

test('says that nothing can have changed', TIMEOUT, () =>
  withPage('versus/same', {}, async page => {
    assert.match(await page.locator('#changed').textContent(),
        /No arc changed by more than the uncertainty/);
    assert.match(await page.locator('#one-sided').textContent(),
        /Every arc is in both/);
  }));

test('keeps hostile names inert and readable', TIMEOUT, () =>
  withPage('versus/hostile', {}, async page => {
    const NAME = '</script><img src=x onerror="document.title=\'broken\'">';
    assert.doesNotMatch(await page.title(), /broken/);
    assert.equal(await page.locator('img').count(), 0);
    assert.equal(await page.locator('script').count(), 3);
    const cells = await cellTexts(page, 0);
    for (const name of [NAME, 'w'.repeat(200), '\u0628\u0648\u0627\u0628\u0629',
                        '\u53cd\u53ca\u9598', '{{data}}<!--']) {
      assert.equal(cells.filter(cell => cell === name).length, 2, name);
    }
    for (const width of [1200, 390]) {
      await page.setViewportSize({width, height: 900});
      assert.equal(await page.evaluate(() =>
          document.documentElement.scrollWidth - innerWidth), 0,
          `no sideways scrolling at ${width} px`);
    }
  }));

test('prints light, with pictures, whatever the screen', TIMEOUT, () =>
  withPage('versus/sample', {colorScheme: 'dark'}, async page => {
    await page.evaluate(() => addEventListener('beforeprint', () => {
      const charts = [...document.querySelectorAll('.chart')];
      window.atPrint = {
        charts: charts.length,
        drawn: charts.filter(chart => chart.querySelector('svg path')).length,
        width: charts[0].querySelector('svg').getAttribute('width'),
        dark: charts[0].innerHTML.includes('#e7e9ee'),
      };
    }));
    const pdf = await page.pdf({preferCSSPageSize: true});
    assert.deepEqual(await page.evaluate(() => window.atPrint),
        {charts: 3, drawn: 3, width: '690', dark: false});
    assert.equal(pdf.subarray(0, 5).toString(), '%PDF-');
  }));

for (const [name, run, options] of [
  ['light', 'sample', {colorScheme: 'light'}],
  ['dark', 'sample', {colorScheme: 'dark'}],
  ['390 px wide', 'sample', {viewport: {width: 390, height: 800}}],
  ['hostile', 'hostile', {}],
  ['the same run', 'same', {}],
]) {
  test(`axe finds nothing: ${name}`, TIMEOUT, () =>
    withPage(`versus/${run}`, options, findsNoViolation));
}

test('holds 5,000 arcs', TIMEOUT, () =>
  withPage('versus/large', {}, async page => {
    const {size} = statSync(`${reports}/versus/large.html`);
    assert.ok(size < MOST_BYTES, `${size} bytes`);
    const loaded = await page.evaluate(() =>
        performance.getEntriesByType('navigation')[0].loadEventEnd);
    const start = performance.now();
    await page.locator('#filter-cell').fill('gate_77');
    await page.locator('#filter-finding').selectOption('changed');
    const text = await page.locator('#arc-count').textContent();
    const filtered = performance.now() - start;
    const chart = page.locator('#difference-charts .chart').first();
    await chart.scrollIntoViewIfNeeded();
    await chart.locator('svg').waitFor();
    console.log(`5,000 arcs: ${size} bytes, loaded in ${Math.round(loaded)} ` +
                `ms, filtered in ${Math.round(filtered)} ms`);
    assert.match(text, /^\d+ of 4999 arcs$/);
    assert.ok(loaded < PATIENCE * USABLE_MS, `loaded in ${loaded} ms`);
    await page.getByRole('button', {name: 'Show all'}).click();
    await page.getByRole('button', {name: 'Show more rows'}).click();
    assert.equal(await shownRows(page).count(), 400);
  }));
