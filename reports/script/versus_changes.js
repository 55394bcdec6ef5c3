// The pictures of two runs: change against size, for g and for p, and the
// change of g by what drives the output.
'use strict';

// A triangle points the way the output moves.
const EDGES = {
  rise: {symbol: 'triangle', symbolSize: 8},
  fall: {symbol: 'triangle', symbolRotate: 180, symbolSize: 8},
};

const changesOf = figure =>
  data.arcs.map((arc, i) => ({arc, i, f: arc[figure]}))
      .filter(({f}) => f[CHANGE] !== null);

// In per cent: room for every mark and bar, and for the lines of agreement.
function changeScale(arcs) {
  const reach = [1, -1].map(sign => Math.max(1.2 * data.agreement,
      ...arcs.map(({f}) => sign * f[CHANGE] +
          (hasWhiskers() ? f[CHANGE_EXPANDED] ?? 0 : 0))));
  const step = [5, 10, 20, 50, 100, 200, 500, 1000].find(
      size => 100 * Math.max(...reach) <= 4 * size) ?? 2000;
  const [max, min] = reach.map(r => Math.ceil(102 * r / step) * step);
  return {min: -min, max, interval: step};
}

function sizeScale(figure, arcs) {
  const xs = arcs.map(({f}) => f[IN_A]);
  if (figure !== 'g' || xs.some(x => x <= 0)) {
    return {scale: true, max: value => Math.ceil(value.max)};
  }
  return {type: 'log', logBase: 2,
          min: 2 ** Math.floor(Math.log2(Math.min(1, ...xs))),
          max: 2 ** Math.ceil(Math.log2(Math.max(2, ...xs)))};
}

// In the words of the table, so that no number is rounded twice.
function describeArc(i) {
  const arc = data.arcs[i];
  const texts = [...rows[i].cells].map(cell =>
      cell.textContent.replaceAll(' %', '\u00a0%'));
  return [`${shortened(cellOf(arc), 40)}  ${shortened(arc.n, 40)}`,
          shortened(cornerOf(arc), 40),
          `g ${texts[3]} in A, ${texts[4]} in B: ${texts[5]}`,
          `p ${texts[6]} in A, ${texts[7]} in B: ${texts[8]}`,
          arc.f].join('\n');
}

const describePoint = ({data: point}) => describeArc(point[2]);
const toTable = ({data: point}) => showCell(point[2]);

// `at` gives an arc its place along the picture.
const edgeMarks = (arcs, at, theme) => Object.entries(EDGES).map(
    ([edge, mark]) => ({
      type: 'scatter', name: edge, ...mark, z: 3,
      itemStyle: {color: theme[edge], opacity: 0.85},
      data: arcs.filter(({arc}) => arc.e === edge)
          .map(entry => [at(entry), 100 * entry.f[CHANGE], entry.i]),
    }));

function agreementLines(theme) {
  const line = (yAxis, type) => ({
    yAxis, lineStyle: {color: theme.ink, width: 1, type},
    name: yAxis ? percent(yAxis / 100) : '',
  });
  return {
    type: 'line', silent: true, data: [],
    markLine: {
      silent: true, symbol: 'none',
      label: {color: theme.ink, fontFamily: FONT, padding: [1, 3],
              backgroundColor: theme.paper, position: 'insideEndTop',
              formatter: '{b}'},
      data: [line(0, 'solid'), line(100 * data.agreement, [6, 4]),
             line(-100 * data.agreement, [6, 4])],
    },
  };
}

function changeOptions(figure) {
  const arcs = changesOf(figure);
  const bars = !hasWhiskers() ? []
      : arcs.filter(({f}) => f[CHANGE_EXPANDED] !== null).map(({f}) =>
          [f[IN_A], 100 * f[CHANGE], 100 * f[CHANGE_EXPANDED]]);
  return theme => ({
    animation: false,
    textStyle: {fontFamily: FONT, color: theme.ink},
    grid: {left: 56, right: 16, top: 18, bottom: 46},
    tooltip: tooltip(theme, describePoint),
    xAxis: axis(theme, `${figure} in A`, sizeScale(figure, arcs)),
    yAxis: axis(theme, 'change from A to B, %',
        {...changeScale(arcs), nameGap: 40}),
    series: [
      whiskers(bars, theme.quiet),
      ...edgeMarks(arcs, ({f}) => f[IN_A], theme),
      agreementLines(theme),
    ],
  });
}

// Mean and standard deviation of each output's changes, in per cent.
function statistics(arcs) {
  return data.outputs.map((name, o) => {
    const changes = arcs.filter(({arc}) => arc.o === o)
        .map(({f}) => 100 * f[CHANGE]);
    const mean = changes.reduce((sum, c) => sum + c, 0) / changes.length;
    const squares = changes.reduce((sum, c) => sum + (c - mean) ** 2, 0);
    return changes.length > 1
        ? [o, mean, Math.sqrt(squares / (changes.length - 1))] : null;
  }).filter(row => row !== null);
}

// A bar across at the mean, and beside it its deviation up and down.
const meanBars = (stats, theme) => ({
  type: 'custom', silent: true, z: 2, data: stats, encode: {x: 0, y: [1]},
  renderItem: (params, api) => {
    const at = shift => api.coord(
        [api.value(0), api.value(1) + shift * api.value(2)]);
    const [x, mean] = at(0);
    const half = 0.24 * api.size([1, 0])[0];
    const [left, high, low] = [x - half, at(1)[1], at(-1)[1]];
    return {
      type: 'path',
      shape: {pathData: `M${left} ${mean}H${x + half}` +
                        `M${left - 3} ${high}H${left + 3}M${left} ${high}` +
                        `V${low}M${left - 3} ${low}H${left + 3}`},
      style: {stroke: theme.ink, fill: 'none', lineWidth: 1.5},
    };
  },
});

// "fall, pull-down 2 high" as "fall" above "2" above "high": narrow enough for
// all of them to stand side by side on a telephone.
const outputLabel = name =>
  (name ?? '').replace(/pull-(down|up) /, '').replace(/,? /g, '\n');

// Neighbours are moved aside by turns, so that few marks hide each other.
function stackOptions() {
  const arcs = changesOf('g')
      .sort((a, b) => a.arc.o - b.arc.o || a.f[CHANGE] - b.f[CHANGE])
      .map((entry, n) => ({...entry, x: entry.arc.o + 0.08 * (n % 5 - 2)}));
  return theme => ({
    animation: false,
    textStyle: {fontFamily: FONT, color: theme.ink},
    grid: {left: 56, right: 16, top: 18, bottom: 70},
    tooltip: tooltip(theme, describePoint),
    xAxis: axis(theme, '', {
      min: -1, max: data.outputs.length, interval: 1,
      splitLine: {show: false}, axisTick: {show: false},
      axisLabel: {color: theme.quiet, fontFamily: FONT, hideOverlap: false,
                  lineHeight: 14,
                  formatter: place => outputLabel(data.outputs[place])},
    }),
    yAxis: axis(theme, 'change of g, %', {
      ...changeScale(arcs), nameGap: 40,
      axisLine: {onZero: false, lineStyle: {color: theme.quiet}},
    }),
    series: [
      meanBars(statistics(arcs), theme),
      ...edgeMarks(arcs, ({x}) => x, theme),
      agreementLines(theme),
    ],
  });
}

function addPicture(list, title, label, options) {
  const chart = make('div', {className: 'chart tall'});
  chart.setAttribute('role', 'img');
  chart.setAttribute('aria-label', label);
  list.append(make('figure', {},
      make('figcaption', {}, make('strong', {textContent: title})), chart));
  addChart(chart, options, {onClick: toTable});
}

function showChanges() {
  const {length} = changesOf('g');
  addPicture(element('stack-chart'), 'change of g by what drives the output',
      `Change of g of ${length} arcs, by what drives the output. The table ` +
      `below has its numbers.`, stackOptions());
  for (const [figure, title] of [['g', 'effort g'],
                                 ['p', 'parasitic delay p, in tau']]) {
    const near = changesOf(figure).filter(
        ({f}) => Math.abs(f[CHANGE]) <= data.agreement).length;
    addPicture(element('difference-charts'), title,
        `Change of ${title} from A to B against its size in A: ${near} of ` +
        `${length} arcs within ${percent(data.agreement).slice(1)}. The ` +
        `table of arcs has the numbers.`, changeOptions(figure));
  }
  element('whiskers').textContent = hasWhiskers()
      ? 'Bars: the expanded uncertainty of the change.'
      : `With more than ${MOST_WHISKERS} arcs the bars of uncertainty are ` +
        `left out.`;
}
