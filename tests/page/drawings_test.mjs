// The drawings of transistors in a browser: see browser_test.sh.
import assert from 'node:assert/strict';
import {test} from 'node:test';
import {TIMEOUT, findsNoViolation, withPage} from './with_page.mjs';

const DRAWINGS = '.circuit svg';

// Texts that are not wholly within their drawing, or lie on another.
const badTexts = page => page.$$eval(DRAWINGS, drawings => {
  const faults = [];
  for (const svg of drawings) {
    const {width, height} = svg.viewBox.baseVal;
    const boxes = [...svg.querySelectorAll('text')].map(text =>
        ({box: text.getBBox(), says: text.firstChild.textContent}));
    for (const [i, {box, says}] of boxes.entries()) {
      if (box.x < 0 || box.y < 0 || box.x + box.width > width ||
          box.y + box.height > height) {
        faults.push(`${says} leaves its drawing`);
      }
      for (const other of boxes.slice(i + 1)) {
        if (box.x < other.box.x + other.box.width &&
            other.box.x < box.x + box.width &&
            box.y + 2 < other.box.y + other.box.height - 2 &&
            other.box.y + 2 < box.y + box.height - 2) {
          faults.push(`${says} lies on ${other.says}`);
        }
      }
    }
  }
  return faults;
});

test('draws the transistors of every cell that has them', TIMEOUT, () =>
  withPage('sample', {javaScriptEnabled: false}, async page => {
    const cells = page.locator('.cell');
    assert.deepEqual(await Promise.all([0, 1, 2].map(i =>
        cells.nth(i).locator('use').count())), [3, 5, 0]);
    assert.match(await cells.nth(2).textContent(),
        /No drawing: this run kept no transistors\./);
    const drawing = cells.nth(1).locator('svg');
    assert.equal(await drawing.getAttribute('aria-label'),
        'stage 1 of nand2, y = !(a & b): 2 PMOS and 2 NMOS devices');
    // The symbols are shown, not only named: a symbol is as tall as its wires.
    const symbol = await drawing.locator('use').first().boundingBox();
    assert.ok(symbol.height >= 20 && symbol.width >= 15, 'a symbol is seen');
    await cells.nth(1).locator('summary').click();
    assert.deepEqual(
        await cells.nth(1).locator('.devices tbody tr').nth(3)
            .locator('th, td').allTextContents().then(
                texts => texts.map(text => text.trim())),
        ['mn_b', 'NMOS', 'b', 'n1', 'vss', '180', '45']);
  }));

for (const [run, drawings] of [['sample', 2], ['hostile', 6], ['large', 100]]) {
  for (const width of [1200, 390]) {
    test(`clips no text: ${run}, ${width} px`, TIMEOUT, () =>
      withPage(run, {viewport: {width, height: 900}}, async page => {
        assert.equal(await page.locator(DRAWINGS).count(), drawings);
        assert.deepEqual(await badTexts(page), []);
        // Text has the size it was drawn for.
        assert.deepEqual(await page.$$eval(DRAWINGS, all => [...new Set(
            all.map(svg => svg.getBoundingClientRect().width -
                           svg.viewBox.baseVal.width))]), [0]);
        assert.equal(await page.evaluate(() =>
            document.documentElement.scrollWidth - innerWidth), 0);
      }));
  }
}

test('keeps the names of nets and devices inert', TIMEOUT, () =>
  withPage('hostile', {}, async page => {
    const first = page.locator('.cell').first();
    const gate = first.locator('.gate text').first();
    assert.equal(await gate.evaluate(text => text.firstChild.textContent),
        '</script><im\u2026');
    assert.equal(await gate.locator('title').textContent(),
        '</script><img src=x onerror="document.title=\'broken\'">');
    assert.match(await first.locator('figcaption').textContent(),
        /Not drawn: <\/script><img src=x .*\(drain and source on /);
  }));

test('prints drawings no wider than the paper', TIMEOUT, () =>
  withPage('hostile', {viewport: {width: 690, height: 900}}, async page => {
    await page.emulateMedia({media: 'print'});
    assert.deepEqual(await page.$$eval(DRAWINGS, all => all.filter(svg =>
        svg.getBoundingClientRect().right > innerWidth).length), 0);
    assert.equal(await page.locator('.circuit details:visible').count(), 0);
  }));

test('axe finds nothing in an open table of devices', TIMEOUT, () =>
  withPage('sample', {}, async page => {
    await page.$$eval('.circuit details', all => all.forEach(details => {
      details.open = true;
    }));
    await findsNoViolation(page);
  }));
