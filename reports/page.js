// The pictures, sorting and filtering of the report page. All the numbers are
// in the page's tables already; `data` is described in
// harness/report/page_data.h.
'use strict';
(() => {
const data = JSON.parse(document.getElementById('data').textContent);
const element = id => document.getElementById(id);
const HAND = 0, MEASURED = 1, DIFFERENCE = 3, EXPANDED = 4, ALLOWED = 5;
const FONT = '"Segoe UI", Roboto, "Noto Sans", "DejaVu Sans", sans-serif';
// Whiskers on more arcs than this hide the marks and take seconds to draw.
const MOST_WHISKERS = 400;
const MOST_WORST = 6;
const ROWS_AT_ONCE = 200;
const PRINT_WIDTH = 690, PRINT_HALF = 335;

const cellOf = arc => data.cells[arc.c];
const cornerOf = arc => data.corners[arc.k];
const percent = ratio => {
  const value = 100 * ratio;
  const text = value.toFixed(Math.abs(value) < 9.95 ? 1 : 0);
  return `${value < 0 ? '' : '+'}${text}\u00a0%`;
};
const shortened = (text, most) =>
  text.length > most ? `${text.slice(0, most - 1)}\u2026` : text;

function make(tag, properties, ...children) {
  const node = Object.assign(document.createElement(tag), properties);
  node.append(...children);
  return node;
}

// ---- Charts -----------------------------------------------------------------

// Every chart: where it is and what it is of. Drawn when it comes into view,
// and again when the colours or the width change.
const charts = new Map();  // Element to {options, chart, half}.
let printing = false;

function colours() {
  // The print is light whatever the screen is; the style says so.
  const style = getComputedStyle(document.documentElement);
  const named = name => style.getPropertyValue(`--${name}`).trim();
  return {
    paper: named('paper'), ink: named('ink'), quiet: named('quiet'),
    rule: named('rule'), within: named('within'), beyond: named('beyond'),
    'not measured': named('unmeasured'),
  };
}

const PRINT_COLOURS = {
  paper: '#ffffff', ink: '#1c2330', quiet: '#525b6b', rule: '#cfd0cd',
  within: '#245a93', beyond: '#9a1a62', 'not measured': '#5a6170',
};

function draw(place) {
  const entry = charts.get(place);
  if (entry.chart) {
    entry.chart.dispose();
  }
  const width = printing ? (entry.half ? PRINT_HALF : PRINT_WIDTH)
                         : place.clientWidth;
  entry.chart = echarts.init(place, null, {renderer: 'svg', width});
  entry.chart.setOption(entry.options(printing ? PRINT_COLOURS : colours()));
  if (entry.onClick) {
    entry.chart.on('click', entry.onClick);
  }
  entry.chart.getZr().flush();
}

const inView = new IntersectionObserver(entries => {
  for (const {target, isIntersecting} of entries) {
    if (isIntersecting && charts.has(target) && !charts.get(target).chart) {
      draw(target);
    }
  }
}, {rootMargin: '300px'});

function addChart(place, options, {half = false, onClick = null} = {}) {
  charts.set(place, {options, half, onClick, chart: null});
  inView.observe(place);
}

function dropCharts(within) {
  for (const [place, entry] of charts) {
    if (within.contains(place)) {
      inView.unobserve(place);
      if (entry.chart) {
        entry.chart.dispose();
      }
      charts.delete(place);
    }
  }
}

const redrawAll = () => {
  for (const [place, entry] of charts) {
    if (entry.chart) {
      draw(place);
    }
  }
};

function axis(theme, name, more) {
  return {
    type: 'value', name, nameLocation: 'middle', nameGap: 28,
    nameTextStyle: {color: theme.quiet, fontFamily: FONT},
    axisLabel: {color: theme.quiet, fontFamily: FONT, hideOverlap: true},
    axisLine: {show: true, lineStyle: {color: theme.quiet}},
    splitLine: {lineStyle: {color: theme.rule, width: 0.5}},
    ...more,
  };
}

const tooltip = (theme, formatter) => ({
  trigger: 'item', renderMode: 'richText', confine: true, formatter,
  backgroundColor: theme.paper, borderColor: theme.quiet, borderWidth: 1,
  textStyle: {color: theme.ink, fontFamily: FONT, fontSize: 12},
});

// From [x, y, half length] a vertical bar with ends.
const whiskers = (points, colour) => ({
  type: 'custom', silent: true, z: 1, data: points,
  encode: {x: 0, y: [1]},
  renderItem: (params, api) => {
    const [x, high] = api.coord([api.value(0), api.value(1) + api.value(2)]);
    const low = api.coord([api.value(0), api.value(1) - api.value(2)])[1];
    return {
      type: 'path',
      shape: {pathData: `M${x - 3} ${high}H${x + 3}M${x} ${high}V${low}` +
                        `M${x - 3} ${low}H${x + 3}`},
      style: {stroke: colour, fill: 'none', lineWidth: 1},
    };
  },
});

// ---- Difference against measured --------------------------------------------

const MARKS = {
  'within': {symbol: 'circle', symbolSize: 6},
  'beyond': {symbol: 'diamond', symbolSize: 10},
  'not measured': {symbol: 'triangle', symbolSize: 9},
};

function differenceOptions(figure, title) {
  const measured = data.arcs.map((arc, i) => ({arc, i, f: arc[figure]}));
  const withLine = measured.filter(({f}) => f[DIFFERENCE] !== null);
  const without = measured.filter(({f}) => f[DIFFERENCE] === null);
  const allowed = [...new Set(measured.map(({f}) => f[ALLOWED]))].sort();
  const reach = Math.max(0.05, ...allowed,
      ...withLine.map(({f}) => Math.abs(f[DIFFERENCE]) + (f[EXPANDED] ?? 0)));
  const step = [10, 20, 50, 100, 200, 500, 1000].find(
      size => 100 * reach <= 4 * size) ?? 2000;
  const top = Math.ceil(102 * reach / step) * step;
  // Arcs without a line stand below the scale, at their hand number.
  const floor = without.length ? -top - step : -top;
  const log = figure === 'g' && withLine.every(({f}) => f[MEASURED] > 0);
  const xs = [...withLine.map(({f}) => f[MEASURED]),
              ...without.map(({f}) => f[HAND])].filter(x => x !== null);
  const scale = log
      ? {type: 'log', logBase: 2,
         min: 2 ** Math.floor(Math.log2(Math.min(1, ...xs))),
         max: 2 ** Math.ceil(Math.log2(Math.max(2, ...xs)))}
      : {scale: true, max: value => Math.ceil(value.max)};
  const bars = withLine.length <= MOST_WHISKERS
      ? withLine.filter(({f}) => f[EXPANDED] !== null) : [];
  const describe = ({data: point}) => {
    const arc = data.arcs[point[2]];
    const f = arc[figure];
    const lines = [`${shortened(cellOf(arc), 40)}  ${shortened(arc.n, 40)}`,
                   shortened(cornerOf(arc), 40)];
    lines.push(f[DIFFERENCE] === null
        ? `${title} by hand ${f[HAND] === null ? '-' : f[HAND].toFixed(3)}`
        : `${title} ${f[MEASURED].toFixed(3)}, by hand ` +
          `${f[HAND].toFixed(3)}: ${percent(f[DIFFERENCE])}`);
    lines.push(arc.v + (arc.b ? ', bent' : ''));
    return lines.join('\n');
  };
  return theme => ({
    animation: false,
    textStyle: {fontFamily: FONT, color: theme.ink},
    grid: {left: 56, right: 16, top: 18, bottom: 46},
    tooltip: tooltip(theme, describe),
    xAxis: axis(theme, `${title} measured`, scale),
    yAxis: axis(theme, 'difference from hand, %', {
      min: floor, max: top, interval: step, nameGap: 40,
      axisLabel: {
        color: theme.quiet, fontFamily: FONT,
        formatter: value => value < -top ? '' : `${value}`,
      },
    }),
    series: [
      whiskers(bars.map(({f}) => [f[MEASURED], 100 * f[DIFFERENCE],
                                  100 * f[EXPANDED]]), theme.quiet),
      ...Object.keys(MARKS).map(verdict => ({
        type: 'scatter', name: verdict, ...MARKS[verdict], z: 3,
        itemStyle: verdict === 'not measured'
            ? {color: theme.paper, borderColor: theme[verdict],
               borderWidth: 1.5}
            : {color: theme[verdict], opacity: 0.85},
        data: [
          ...withLine.filter(({arc}) => arc.v === verdict)
              .map(({f, i}) => [f[MEASURED], 100 * f[DIFFERENCE], i]),
          ...without.filter(({arc, f}) => arc.v === verdict && f[HAND] > 0)
              .map(({f, i}) => [f[HAND], -top - 0.6 * step, i]),
        ],
      })),
      {
        type: 'line', silent: true, data: [],
        markLine: {
          silent: true, symbol: 'none',
          label: {color: theme.ink, fontFamily: FONT, padding: [1, 3],
                  backgroundColor: theme.paper, position: 'insideEndTop',
                  formatter: '{b}'},
          data: [
            {yAxis: 0, name: '', lineStyle: {color: theme.ink, width: 1,
                                             type: 'solid'}},
            ...allowed.flatMap(ratio => [ratio, -ratio].map(limit => ({
              yAxis: 100 * limit, name: `allowed ${percent(limit)}`,
              lineStyle: {color: theme.ink, width: 1, type: [6, 4]},
            }))),
            ...(without.length ? [{
              yAxis: -top, name: 'below: not measured, at the hand number',
              label: {position: 'insideStartBottom'},
              lineStyle: {color: theme.rule, width: 1, type: 'solid'},
            }] : []),
          ],
        },
      },
    ],
  });
}

function showDifferences() {
  const list = element('difference-charts');
  const count = verdict => data.arcs.filter(arc => arc.v === verdict).length;
  for (const [figure, title] of [['g', 'effort g'],
                                 ['p', 'parasitic delay p']]) {
    const chart = make('div', {className: 'chart tall'});
    chart.setAttribute('role', 'img');
    chart.setAttribute('aria-label',
        `Difference of ${title} from the hand number against ${title} ` +
        `measured: ${count('within')} arcs within, ${count('beyond')} ` +
        `beyond, ${count('not measured')} not measured. The table of arcs ` +
        `has the numbers.`);
    list.append(make('figure', {},
        make('figcaption', {}, make('strong', {textContent: title})), chart));
    addChart(chart, differenceOptions(figure, figure),
        {onClick: ({data: point}) => {
          location.hash = `#arc-${point[2] + 1}`;
        }});
  }
  element('whiskers').textContent = data.arcs.length <= MOST_WHISKERS
      ? 'Bars: the uncertainty that the verdict allows for.'
      : `With more than ${MOST_WHISKERS} arcs the bars of uncertainty are ` +
        `left out.`;
}

// ---- Delay against fanout ---------------------------------------------------

const along = (line, fanout) => line[1] + line[0] * fanout;

function pictureOptions(arc) {
  return theme => {
    const right = Math.ceil(1.1 * Math.max(1, ...arc.x.map(([h]) => h)));
    const straight = (line, name, type, colour) => line ? [{
      type: 'line', name, silent: true, showSymbol: false, z: 2,
      lineStyle: {color: colour, width: 1.75, type},
      data: [[0, along(line, 0)], [right, along(line, right)]],
    }] : [];
    const bars = data.u === null ? []
        : arc.x.map(([h, delay]) => [h, delay, 2 * data.u * delay]);
    return {
      animation: false,
      textStyle: {fontFamily: FONT, color: theme.ink},
      grid: {left: 52, right: 14, top: 12, bottom: 44},
      tooltip: tooltip(theme, ({data: point}) =>
          `h = ${point[0]}\n${point[1].toPrecision(4)} ps`),
      xAxis: axis(theme, 'fanout h', {min: 0, max: right}),
      yAxis: axis(theme, 'delay, ps', {min: 0, nameGap: 36}),
      series: [
        ...straight(arc.l, 'fitted', 'solid', theme.ink),
        ...straight(arc.h, 'by hand', [7, 5], theme.quiet),
        whiskers(bars, theme.ink),
        {type: 'scatter', symbolSize: 7, z: 3, data: arc.x,
         itemStyle: {color: theme.ink}},
      ],
    };
  };
}

function pointTable(arc) {
  const table = make('table', {}, make('caption', {className: 'unseen',
      textContent: `Points of ${arc.n}`}));
  const head = table.createTHead().insertRow();
  for (const name of ['fanout', 'delay, ps', '\u00b1, ps', 'fitted, ps',
                      'by hand, ps']) {
    head.append(make('th', {scope: 'col', textContent: name}));
  }
  const body = table.createTBody();
  for (const [h, delay] of arc.x) {
    const row = body.insertRow();
    row.append(make('th', {scope: 'row', textContent: `${h}`}));
    const values = [delay, data.u === null ? null : data.u * delay,
                    arc.l && along(arc.l, h), arc.h && along(arc.h, h)];
    for (const value of values) {
      row.insertCell().textContent = value === null ? '\u2013'
                                                    : value.toFixed(3);
    }
  }
  return table;
}

function figureText(arc) {
  const one = (name, f, digits) => f[MEASURED] === null
      ? `${name} by hand ${f[HAND] === null ? '\u2013' : f[HAND].toFixed(digits)}`
      : `${name} ${f[MEASURED].toFixed(digits)}, by hand ` +
        `${f[HAND].toFixed(digits)} (${percent(f[DIFFERENCE])})`;
  return `${one('g', arc.g, 3)}; ${one('p', arc.p, 2)}`;
}

function picture(i) {
  const arc = data.arcs[i];
  const name = `${cellOf(arc)} ${arc.n}`;
  const chart = make('div', {className: 'chart'});
  chart.setAttribute('role', 'img');
  chart.setAttribute('aria-label', `Delay of ${name} against fanout, ` +
      `${arc.x.length} points. ${figureText(arc)}. ${arc.v}.`);
  const verdict = make('span', {
    className: arc.v === 'not measured' ? 'unmeasured' : arc.v,
    textContent: arc.v,
  });
  const caption = make('figcaption', {},
      make('strong', {}, make('bdi', {textContent: name})),
      `at ${cornerOf(arc)}${arc.s ? `, with ${arc.s}` : ''}: `, verdict,
      `${arc.b ? ', bent' : ''}. ${figureText(arc)}.`);
  const shown = make('figure', {id: `picture-${i + 1}`, tabIndex: -1}, caption);
  if (!arc.x.length) {
    shown.append(make('p', {textContent: 'No point was measured.'}));
    return shown;
  }
  shown.append(chart, make('details', {},
      make('summary', {textContent: 'The numbers'}), pointTable(arc)));
  addChart(chart, pictureOptions(arc), {half: true});
  return shown;
}

function showPictures(places, note) {
  const list = element('picture-list');
  dropCharts(list);
  list.replaceChildren(...places.map(picture));
  const bars = data.u === null ? ''
      : ' Bars: two standard uncertainties of the delay, often smaller than ' +
        'the point.';
  element('picture-note').textContent =
      `${note} Solid: the fitted line; dashed: the hand line.${bars}`;
}

function worstPlaces() {
  return data.arcs.map((arc, i) => [Math.abs(arc.g[DIFFERENCE] ?? -1), i])
      .filter(([size]) => size >= 0)
      .sort(([a], [b]) => b - a).slice(0, MOST_WORST).map(([, i]) => i);
}

function showChosen() {
  const cell = element('picture-cell').value;
  const corner = element('picture-corner').value;
  element('picture-corner').parentElement.hidden = cell === '';
  if (cell === '') {
    const places = worstPlaces();
    showPictures(places, places.length
        ? `The arcs whose g differs most.`
        : 'No arc was measured.');
    return;
  }
  const places = data.arcs.map((arc, i) => i).filter(i =>
      data.arcs[i].c === Number(cell) && data.arcs[i].k === Number(corner));
  showPictures(places, places.length
      ? `${places.length} ${places.length === 1 ? 'arc' : 'arcs'}.`
      : 'The run has no such arc.');
}

function showArcOfHash() {
  const match = /^#arc-(\d+)$/.exec(location.hash);
  const arc = match && data.arcs[Number(match[1]) - 1];
  if (!arc) {
    return;
  }
  element('picture-cell').value = String(arc.c);
  element('picture-corner').value = String(arc.k);
  showChosen();
  const shown = element(`picture-${match[1]}`);
  shown.focus({preventScroll: true});
  shown.scrollIntoView({block: 'center'});
}

function preparePictures() {
  const cells = element('picture-cell');
  cells.append(make('option', {value: '', textContent: 'the largest differences'}));
  data.cells.forEach((name, i) => cells.append(
      make('option', {value: String(i), textContent: shortened(name, 60)})));
  data.corners.forEach((name, i) => element('picture-corner').append(
      make('option', {value: String(i), textContent: shortened(name, 60)})));
  element('picture-choice').hidden = element('picture-note').hidden = false;
  element('picture-choice').addEventListener('change', showChosen);
  element('picture-choice').addEventListener('submit',
      event => event.preventDefault());
  showChosen();
  addEventListener('hashchange', showArcOfHash);
  // A second click on the same link changes no hash.
  document.addEventListener('click', event => {
    const link = event.target.closest?.('a[href^="#arc-"]');
    if (link && link.hash === location.hash) {
      event.preventDefault();
      showArcOfHash();
    }
  });
}

// ---- The table --------------------------------------------------------------

const VERDICTS = ['within', 'not measured', 'beyond'];
const SORT_KEYS = {
  cell: cellOf, arc: arc => arc.n, corner: cornerOf,
  g0: arc => arc.g[HAND], g1: arc => arc.g[MEASURED],
  g3: arc => arc.g[DIFFERENCE],
  p0: arc => arc.p[HAND], p1: arc => arc.p[MEASURED],
  p3: arc => arc.p[DIFFERENCE],
  verdict: arc => VERDICTS.indexOf(arc.v),
};
const collator = new Intl.Collator('en', {numeric: true});

function compare(a, b) {
  return typeof a === 'string' ? collator.compare(a, b) : a - b;
}

// What has no value stays last in both directions.
function sorted(places, key, direction) {
  const value = SORT_KEYS[key];
  return places.map(i => [value(data.arcs[i]), i]).sort(([a, i], [b, j]) => {
    if (a === null || b === null) {
      return (a === null) - (b === null) || i - j;
    }
    return direction * compare(a, b) || i - j;
  }).map(([, i]) => i);
}

const table = element('arc-table');
const rows = [...table.tBodies].flatMap(body => [...body.rows]);
const order = {key: null, direction: 1};
let limit = ROWS_AT_ONCE;

function passing() {
  const cell = element('filter-cell').value.trim().toLowerCase();
  const corner = element('filter-corner').value;
  const edge = element('filter-edge').value;
  const verdict = element('filter-verdict').value;
  return rows.map((row, i) => i).filter(i => {
    const arc = data.arcs[i];
    return (!cell || cellOf(arc).toLowerCase().includes(cell)) &&
        (!corner || arc.k === Number(corner)) && (!edge || arc.e === edge) &&
        (!verdict || (verdict === 'bent' ? arc.b : arc.v === verdict));
  });
}

function showRows() {
  const places = order.key ? sorted(passing(), order.key, order.direction)
                           : passing();
  table.tBodies[0].replaceChildren(
      ...places.slice(0, limit).map(i => rows[i]));
  const shown = Math.min(limit, places.length);
  const passed = places.length === rows.length
      ? `${rows.length} arcs` : `${places.length} of ${rows.length} arcs`;
  element('arc-count').textContent = shown < places.length
      ? `${passed}; the first ${shown} are shown` : passed;
  element('more-rows').hidden = shown === places.length;
}

function sortBy(head) {
  const key = head.dataset.key;
  order.direction = order.key === key ? -order.direction : 1;
  order.key = key;
  for (const other of table.tHead.rows[0].cells) {
    other.removeAttribute('aria-sort');
  }
  head.setAttribute('aria-sort',
      order.direction > 0 ? 'ascending' : 'descending');
  showRows();
}

function prepareTable() {
  for (const head of table.tHead.rows[0].cells) {
    const button = make('button', {type: 'button',
                                   textContent: head.textContent});
    button.addEventListener('click', () => sortBy(head));
    head.replaceChildren(button);
  }
  data.corners.forEach((name, i) => element('filter-corner').append(
      make('option', {value: String(i), textContent: shortened(name, 60)})));
  const refilter = () => {
    limit = ROWS_AT_ONCE;
    showRows();
  };
  const filters = element('filters');
  filters.addEventListener('input', refilter);
  filters.addEventListener('reset', () => setTimeout(refilter));
  filters.addEventListener('submit', event => event.preventDefault());
  element('more-rows').firstElementChild.addEventListener('click', () => {
    limit += ROWS_AT_ONCE;
    showRows();
  });
  for (const extra of [...table.tBodies].slice(1)) {
    extra.remove();
  }
  filters.hidden = element('arc-count').hidden = false;
  showRows();
}

// ---- The whole --------------------------------------------------------------

function print(begins) {
  printing = begins;
  element('plan').open = begins;
  for (const place of charts.keys()) {
    draw(place);
  }
}

prepareTable();
showDifferences();
preparePictures();
showArcOfHash();
matchMedia('(prefers-color-scheme: dark)').addEventListener('change', redrawAll);
addEventListener('beforeprint', () => print(true));
addEventListener('afterprint', () => print(false));
let width = innerWidth;
addEventListener('resize', () => {
  if (innerWidth !== width && !printing) {
    width = innerWidth;
    redrawAll();
  }
});
})();
