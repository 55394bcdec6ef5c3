// Waveforms in a browser: see browser_test.sh and make_waves.sh.
import assert from 'node:assert/strict';
import {test} from 'node:test';
import {TIMEOUT, findsNoViolation, withPage} from './with_page.mjs';

// Four arcs of nand2 and four of xor2.
const REAL = 8;

const figures = page => page.locator('#wave-list figure');

async function drawAll(page) {
  for (const chart of await page.locator('.chart.waves').all()) {
    await chart.scrollIntoViewIfNeeded();
    await chart.locator('svg').waitFor();
  }
}

test('draws what was measured, of a real run', TIMEOUT, () =>
  withPage('waves/real', {}, async page => {
    // No doubt about any: each is the simulation of the run.
    assert.equal(await figures(page).count(), REAL);
    assert.equal(await page.locator('.doubt').count(), 0);
    await drawAll(page);
    for (const figure of await figures(page).all()) {
      const caption = await figure.locator('figcaption').textContent();
      const [, delay, hand] = /Delay ([\d.]+ ps), by hand ([\d.]+ ps)/
          .exec(caption);
      const picture = await figure.locator('svg').textContent();
      const [, input, , output] = /: (\S+) (rises|falls), (\S+) (rises|falls)\./
          .exec(caption);
      for (const part of [`delay ${delay}`, `hand ${hand}`, `input ${input}`,
                          `output ${output}`, '20\u00a0%', '50\u00a0%',
                          '80\u00a0%', 'time, ps']) {
        assert.ok(picture.includes(part), `${caption}: ${part} in ${picture}`);
      }
      await figure.locator('summary').click();
      const rows = await figure.locator('tbody tr').evaluateAll(all =>
          all.map(row => [...row.cells].map(cell => cell.textContent)));
      assert.deepEqual(rows.map(([name]) => name),
          ['delay', `transition of ${input}`, `transition of ${output}`]);
      for (const [, value, , , from, , , to] of rows) {
        // Each is rounded to 0.001 ps.
        assert.ok(Math.abs(value - (to - from)) < 0.00201, `${caption}`);
      }
      assert.match(delay, new RegExp(`^${rows[0][1].slice(0, 4)}`));
    }
  }));

// The marks are where the lines are: the centre of each circle is on a path.
test('has its marks on its lines', TIMEOUT, () =>
  withPage('waves/real', {}, async page => {
    await drawAll(page);
    const data = JSON.parse(await page.locator('#waves-data').textContent());
    assert.equal(data.length, REAL);
    for (const {nets, marks, view} of data) {
      assert.equal(marks[0].from[1], 0, 'time 0 is where the delay begins');
      for (const {from, to} of marks) {
        for (const [net, time, level] of [from, to]) {
          const {line} = nets[net];
          const after = line.findIndex(([t]) => t >= time);
          const [[t0, v0], [t1, v1]] = [line[after - 1], line[after]];
          const drawn = v0 + (v1 - v0) * (time - t0) / (t1 - t0);
          // 1 mV of thinning, and what a chord departs from the curve.
          assert.ok(Math.abs(drawn - level) < 0.004, `${drawn} for ${level}`);
          assert.ok(time > view[0] && time < view[1], 'in sight');
        }
      }
    }
  }));

test('leads to waveforms only where there are some', TIMEOUT, async () => {
  await withPage('sample', {}, async page => {
    assert.equal(await page.locator('nav a[href="#waves"]').count(), 0);
    assert.equal(await page.locator('#waves').count(), 0);
  });
  await withPage('waves/real', {}, async page => {
    await page.locator('nav a[href="#waves"]').click();
    assert.ok(await page.locator('#waves h2').isVisible());
  });
});

test('says all of it without scripts', TIMEOUT, () =>
  withPage('waves/real', {javaScriptEnabled: false}, async page => {
    assert.match(await page.locator('#waves').innerText(),
        /pictures need scripts/);
    await page.locator('#waves summary').first().click();
    assert.equal(
        await page.locator('#waves tbody tr:visible').count(), 3);
  }));

test('tells of doubt and of trouble, and keeps names inert', TIMEOUT, () =>
  withPage('waves/hostile', {}, async page => {
    assert.equal(await figures(page).count(), 12);
    await drawAll(page);
    assert.equal(await page.locator('#waves img').count(), 0);
    assert.equal(await page.locator('.chart.waves').count(), 11);
    const doubts = await page.locator('.doubt').allTextContents();
    assert.equal(doubts.filter(text =>
        text === 'No waveforms. the store has no job gone.').length, 1);
    assert.equal(doubts.filter(text => /^Not the simulation of the run\. The /
        .test(text)).length, 11);
    for (const width of [1200, 390]) {
      await page.setViewportSize({width, height: 900});
      assert.equal(await page.evaluate(() =>
          document.documentElement.scrollWidth - innerWidth), 0,
          `no sideways scrolling at ${width} px`);
    }
  }));

test('draws no text outside of its picture', TIMEOUT, async () => {
  for (const width of [1200, 390]) {
    for (const run of ['waves/real', 'waves/hostile']) {
      await withPage(run, {viewport: {width, height: 900}}, async page => {
        await drawAll(page);
        const outside = await page.$$eval('.chart.waves svg', all =>
            all.flatMap(svg => {
              const edge = svg.getBoundingClientRect();
              return [...svg.querySelectorAll('text')].filter(text => {
                const box = text.getBoundingClientRect();
                return box.left < edge.left - 1 || box.right > edge.right + 1;
              }).map(text => text.textContent);
            }));
        assert.deepEqual(outside, [], `${run}, ${width} px`);
      });
    }
  }
});

test('prints every picture, light', TIMEOUT, () =>
  withPage('waves/real', {colorScheme: 'dark'}, async page => {
    await page.evaluate(() => addEventListener('beforeprint', () => {
      const all = [...document.querySelectorAll('.chart.waves')];
      window.atPrint = all.map(chart => ({
        drawn: chart.querySelector('svg path') !== null,
        width: chart.querySelector('svg')?.getAttribute('width'),
        dark: chart.innerHTML.includes('#e7e9ee'),
      }));
    }));
    await page.pdf({preferCSSPageSize: true});
    const atPrint = await page.evaluate(() => window.atPrint);
    assert.equal(atPrint.length, REAL);
    for (const picture of atPrint) {
      assert.deepEqual(picture, {drawn: true, width: '335', dark: false});
    }
  }));

for (const [name, options] of [
  ['light', {colorScheme: 'light'}],
  ['dark', {colorScheme: 'dark'}],
  ['390 px wide', {viewport: {width: 390, height: 800}}],
]) {
  test(`axe finds nothing about waveforms: ${name}`, TIMEOUT, () =>
    withPage('waves/real', options, async page => {
      await drawAll(page);
      await page.$$eval('#waves details', all => all.forEach(details => {
        details.open = true;
      }));
      await findsNoViolation(page);
    }));
}
