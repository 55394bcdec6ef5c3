// Every chart of the page: drawn when it comes into view, and again when the
// colours or the width change.
'use strict';

const hasWhiskers = () => data.arcs.length <= MOST_WHISKERS;
const charts = new Map();  // Element to {options, chart, half}.
let printing = false;

function colours() {
  // The print is light whatever the screen is; the style says so.
  const style = getComputedStyle(document.documentElement);
  const named = name => style.getPropertyValue(`--${name}`).trim();
  return {
    paper: named('paper'), ink: named('ink'), quiet: named('quiet'),
    rule: named('rule'), within: named('within'), beyond: named('beyond'),
    'not measured': named('unmeasured'), rise: named('rise'),
    fall: named('fall'),
  };
}

const PRINT_COLOURS = {
  paper: '#ffffff', ink: '#1c2330', quiet: '#525b6b', rule: '#cfd0cd',
  within: '#245a93', beyond: '#9a1a62', 'not measured': '#5a6170',
  rise: '#44399a', fall: '#7a4a12',
};

// The size of a print does not follow the window's.
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
