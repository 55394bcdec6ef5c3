// The main picture: difference from the hand number against the number
// measured, for g and for p.
'use strict';

const MARKS = {
  'within': {symbol: 'circle', symbolSize: 6},
  'beyond': {symbol: 'diamond', symbolSize: 10},
  'not measured': {symbol: 'triangle', symbolSize: 9},
};

// The arcs of one figure: those with a line, and those without.
function differencesOf(figure) {
  const all = data.arcs.map((arc, i) => ({arc, i, f: arc[figure]}));
  return {
    withLine: all.filter(({f}) => f[DIFFERENCE] !== null),
    without: all.filter(({f}) => f[DIFFERENCE] === null),
    allowed: [...new Set(all.map(({f}) => f[ALLOWED]))].sort(),
  };
}

// In per cent: room for every mark and bar, in whole steps. Arcs without a line
// stand below the scale, in one step more.
function verticalScale({withLine, without, allowed}) {
  const reach = [1, -1].map(sign => Math.max(0.05, ...allowed,
      ...withLine.map(({f}) => sign * f[DIFFERENCE] + (f[EXPANDED] ?? 0))));
  const step = [10, 20, 50, 100, 200, 500, 1000].find(
      size => 100 * Math.max(...reach) <= 4 * size) ?? 2000;
  const [top, depth] = reach.map(r => Math.ceil(102 * r / step) * step);
  return {top, depth, step, floor: without.length ? -depth - step : -depth};
}

// Efforts are told apart by their ratio, parasitic delays by their difference.
function horizontalScale(figure, {withLine, without}) {
  const xs = [...withLine.map(({f}) => f[MEASURED]),
              ...without.map(({f}) => f[HAND])].filter(x => x !== null);
  if (figure !== 'g' || xs.some(x => x <= 0)) {
    return {scale: true, max: value => Math.ceil(value.max)};
  }
  return {type: 'log', logBase: 2,
          min: 2 ** Math.floor(Math.log2(Math.min(1, ...xs))),
          max: 2 ** Math.ceil(Math.log2(Math.max(2, ...xs)))};
}

function describePoint({data: [, , i]}) {
  const arc = data.arcs[i];
  return [`${shortened(cellOf(arc), 40)}  ${shortened(arc.n, 40)}`,
          shortened(cornerOf(arc), 40), ...figureText(i).split('; '),
          arc.v + (arc.b ? ', bent' : '')].join('\n');
}

function marksOf(verdict, {withLine, without}, {depth, step}, theme) {
  return {
    type: 'scatter', name: verdict, ...MARKS[verdict], z: 3,
    itemStyle: verdict === 'not measured'
        ? {color: theme.paper, borderColor: theme[verdict], borderWidth: 1.5}
        : {color: theme[verdict], opacity: 0.85},
    data: [
      ...withLine.filter(({arc}) => arc.v === verdict)
          .map(({f, i}) => [f[MEASURED], 100 * f[DIFFERENCE], i]),
      ...without.filter(({arc, f}) => arc.v === verdict && f[HAND] > 0)
          .map(({f, i}) => [f[HAND], -depth - 0.6 * step, i]),
    ],
  };
}

// What is allowed, the hand number, and where the scale ends.
function limitLines({without, allowed}, {depth}, theme) {
  const line = (yAxis, name, type, more) => ({
    yAxis, name, lineStyle: {color: theme.ink, width: 1, type}, ...more,
  });
  return {
    type: 'line', silent: true, data: [],
    markLine: {
      silent: true, symbol: 'none',
      label: {color: theme.ink, fontFamily: FONT, padding: [1, 3],
              backgroundColor: theme.paper, position: 'insideEndTop',
              formatter: '{b}'},
      data: [
        line(0, '', 'solid'),
        ...allowed.flatMap(ratio => [ratio, -ratio].map(limit =>
            line(100 * limit, `allowed ${percent(limit)}`, [6, 4]))),
        ...(without.length ? [
          line(-depth, 'below: not measured, at the hand number', 'solid',
               {label: {position: 'insideStartBottom'}})] : []),
      ],
    },
  };
}

function differenceOptions(figure) {
  const arcs = differencesOf(figure);
  const scale = verticalScale(arcs);
  const bars = !hasWhiskers() ? []
      : arcs.withLine.filter(({f}) => f[EXPANDED] !== null)
          .map(({f}) => [f[MEASURED], 100 * f[DIFFERENCE], 100 * f[EXPANDED]]);
  return theme => ({
    animation: false,
    textStyle: {fontFamily: FONT, color: theme.ink},
    grid: {left: 56, right: 16, top: 18, bottom: 46},
    tooltip: tooltip(theme, describePoint),
    xAxis: axis(theme, `${figure} measured`, horizontalScale(figure, arcs)),
    yAxis: axis(theme, 'difference from hand, %', {
      min: scale.floor, max: scale.top, interval: scale.step, nameGap: 40,
      axisLabel: {
        color: theme.quiet, fontFamily: FONT,
        formatter: value => value < -scale.depth ? '' : `${value}`,
      },
    }),
    series: [
      whiskers(bars, theme.quiet),
      ...Object.keys(MARKS).map(
          verdict => marksOf(verdict, arcs, scale, theme)),
      limitLines(arcs, scale, theme),
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
    addChart(chart, differenceOptions(figure),
        {onClick: ({data: point}) => {
          location.hash = `#arc-${point[2] + 1}`;
        }});
  }
  element('whiskers').textContent = hasWhiskers()
      ? 'Bars: the uncertainty that the verdict allows for.'
      : `With more than ${MOST_WHISKERS} arcs the bars of uncertainty are ` +
        `left out.`;
}
