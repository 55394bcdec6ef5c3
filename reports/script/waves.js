// Waveforms, with what was measured on them: a picture an arc that they were
// asked for. `waves` is described in harness/page/waves_data.h.
'use strict';

const waves = JSON.parse(element('waves-data')?.textContent ?? '[]');
const [NET, TIME, LEVEL, EDGE] = [0, 1, 2, 3];
// Where the brackets lie, in supplies: above and below the waveforms.
const DELAY_ROW = 1.15, HAND_ROW = 1.33, TRANSITION_ROWS = [-0.17, -0.35];
const LOWEST = -0.46, HIGHEST = 1.46;

const labelled = (name, most) => shortened(name.replace(/\s/g, ' '), most);
const volts = level => `${Number(level.toPrecision(3))} V`;

// The time at which a line passes a level first, or none.
function timeAt(line, level) {
  const i = line.findIndex(([, v], k) =>
      k > 0 && (v - level) * (line[k - 1][1] - level) <= 0);
  if (i < 0) {
    return null;
  }
  const [[t0, v0], [t1, v1]] = [line[i - 1], line[i]];
  return v1 === v0 ? t0 : t0 + (t1 - t0) * (level - v0) / (v1 - v0);
}

const heightOf = ({supply, nets}) =>
    supply ?? Math.max(...nets.flatMap(({line}) => line.map(([, v]) => v)));

// The names, where no other line is: at the left ends on the two rails; of
// edges in the same direction, outside the two.
function namePlaces(wave) {
  const {view, nets, marks: [delay]} = wave;
  const height = heightOf(wave);
  const ends = [['input', delay.from[NET]], ['output', delay.to[NET]]].map(
      ([role, net]) => ({
        text: `${role} ${labelled(nets[net].name, 16)}`,
        name: labelled(nets[net].name, 16), line: nets[net].line,
      }));
  const levels = ends.map(({line}) => line[0][1]);
  if (Math.abs(levels[0] - levels[1]) > height / 2) {
    return ends.map(({text, name}, i) => ({
      text, name, at: [view[0], levels[i]], dx: 5, align: 'left',
      dy: levels[i] > height / 2 ? 11 : -11,
    }));
  }
  const level = 0.65 * height;
  const placed = ends.map(({text, name, line}) => ({
    text, name, at: [timeAt(line, level) ?? view[0], level], dy: 0,
  }));
  const inputFirst = placed[0].at[0] <= placed[1].at[0];
  return placed.map((place, i) => (i === 0) === inputFirst
      ? {...place, dx: -8, align: 'right'} : {...place, dx: 8, align: 'left'});
}

// The intervals as brackets: level of each end, row, and what they say, long
// and short.
function bracketsOf(wave) {
  const {nets, marks: [delay, ...transitions], hand} = wave;
  const height = heightOf(wave);
  const bracket = (from, to, row, texts, dash = null) => ({
    ends: [[from[TIME], from[LEVEL]], [to[TIME], to[LEVEL]]]
        .sort(([a], [b]) => a - b),
    row: row * height, texts, dash,
  });
  return [
    bracket(delay.from, delay.to, DELAY_ROW,
        [`delay ${delay.text}`, delay.text]),
    ...(hand === null ? [] : [bracket(
        delay.from, [0, hand[0], delay.to[LEVEL]], HAND_ROW,
        [`by hand ${hand[1]}`, `hand ${hand[1]}`], [2, 3])]),
    ...transitions.map(({name, from, to, text}, i) => bracket(
        from, to, TRANSITION_ROWS[i % 2],
        [`${labelled(name, 26)} ${text}`,
         `${labelled(nets[from[NET]].name, 10)} ${text}`])),
  ];
}

const PIXELS_A_LETTER = 6.6;

// In the bracket, in a gap of it; or beside it, where there is room.
function textPlace(texts, left, right, {x, width}) {
  const inside = (text, needed) => ({
    text, x: (left + right) / 2, align: 'center', gap: needed / 2 + 3});
  for (const text of texts) {
    const needed = PIXELS_A_LETTER * text.length;
    if (right - left >= needed + 24) {
      return inside(text, needed);
    }
    if (right + 6 + needed <= x + width) {
      return {text, x: right + 6, align: 'left', gap: 0};
    }
    if (left - 6 - needed >= x) {
      return {text, x: left - 6, align: 'right', gap: 0};
    }
  }
  return inside(texts[1], PIXELS_A_LETTER * texts[1].length);
}

function bracketSeries(wave, theme) {
  const brackets = bracketsOf(wave);
  return {
    type: 'custom', silent: true, z: 2,
    data: brackets.map(({ends: [[from], [to]], row}) => [from, row, to]),
    encode: {x: [0, 2], y: 1},
    renderItem: (params, api) => {
      const {ends, row, texts, dash} = brackets[params.dataIndex];
      const [[left, y], [right]] = ends.map(([t]) => api.coord([t, row]));
      const foot = ends.map(([t, v]) => api.coord([t, v])[1]);
      const style = {stroke: theme.quiet, fill: 'none', lineWidth: 1};
      const place = textPlace(texts, left, right, params.coordSys);
      return {type: 'group', children: [
        {type: 'path', style: {...style, lineDash: [1, 3]}, shape: {pathData:
            `M${left} ${foot[0]}V${y}M${right} ${foot[1]}V${y}`}},
        {type: 'path', style: {...style, stroke: theme.ink, lineDash: dash},
         shape: {pathData: place.gap
             ? `M${left} ${y}H${Math.max(left, place.x - place.gap)}` +
               `M${Math.min(right, place.x + place.gap)} ${y}H${right}`
             : `M${left} ${y}H${right}`}},
        {type: 'path', style: {...style, stroke: theme.ink}, shape: {pathData:
            `M${left} ${y - 4}V${y + 4}M${right} ${y - 4}V${y + 4}`}},
        {type: 'text', style: {
          text: place.text, x: place.x, y, textAlign: place.align,
          textVerticalAlign: 'middle', fill: theme.ink, font: `12px ${FONT}`,
          stroke: theme.paper, lineWidth: 3,
        }},
      ]};
    },
  };
}

function nameSeries(wave, theme) {
  const places = namePlaces(wave);
  return {
    type: 'custom', silent: true, z: 4, data: places.map(({at}) => at),
    renderItem: ({dataIndex, coordSys}, api) => {
      const {text, name, at, dx, dy, align} = places[dataIndex];
      const [x, y] = api.coord(at);
      const fits = align === 'left' ||
          x + dx - PIXELS_A_LETTER * text.length > coordSys.x + 4;
      return {type: 'text', style: {
        text: fits ? text : name, x: x + dx, y: y + dy, textAlign: align,
        textVerticalAlign: 'middle', fill: theme.ink, font: `600 12px ${FONT}`,
        stroke: theme.paper, lineWidth: 3,
      }};
    },
  };
}

// Every crossing: those of the delay filled, of transitions open; and where the
// hand numbers put the output's.
function crossingSeries({nets, marks, hand}, theme) {
  const say = ({name}, verb, level, time) => `${labelled(name, 30)} ` +
      `${verb}s through ${volts(level)}\nat ${Number(time.toFixed(3))} ps`;
  const marked = (ends, symbol, filled) => ({
    type: 'scatter', symbol, symbolSize: symbol === 'diamond' ? 10 : 8, z: 5,
    itemStyle: {color: filled ? theme.ink : theme.paper,
                borderColor: theme.ink, borderWidth: 1.5},
    data: ends,
  });
  const ends = mark => [mark.from, mark.to].map(end => [
    end[TIME], end[LEVEL],
    say(nets[end[NET]], end[EDGE], end[LEVEL], end[TIME])]);
  const [delay, ...transitions] = marks;
  return [
    marked(transitions.flatMap(ends), 'circle', false),
    marked(hand === null ? [] : [[hand[0], delay.to[LEVEL],
        `by hand: ${hand[1]}`]], 'diamond', false),
    marked(ends(delay), 'circle', true),
  ];
}

function levelLines({supply, marks}, theme) {
  const levels = new Set(marks.flatMap(({from, to}) =>
      [from[LEVEL], to[LEVEL]]));
  return {
    type: 'line', silent: true, data: [],
    markLine: {
      silent: true, symbol: 'none',
      lineStyle: {color: theme.rule, width: 1, type: 'solid'},
      label: {position: 'end', color: theme.quiet, fontFamily: FONT,
              formatter: '{b}'},
      data: [...levels].map(level => ({
        yAxis: level,
        name: supply ? `${Math.round(100 * level / supply)}\u00a0%`
                     : volts(level),
      })),
    },
  };
}

function waveOptions(wave) {
  const height = heightOf(wave);
  const step = [0.1, 0.2, 0.5, 1, 2, 5].find(size => height <= 6 * size) ?? 10;
  const ticks = Array.from({length: Math.floor(height / step + 1.01)},
      (_, i) => Number((i * step).toPrecision(3)));
  const isOutput = i => i === wave.marks[0].to[NET];
  return theme => ({
    animation: false,
    textStyle: {fontFamily: FONT, color: theme.ink},
    grid: {left: 46, right: 42, top: 6, bottom: 44},
    tooltip: tooltip(theme, ({data: [, , text]}) => text),
    xAxis: axis(theme, 'time, ps', {
      min: wave.view[0], max: wave.view[1], splitLine: {show: false},
      axisLine: {onZero: false, lineStyle: {color: theme.quiet}},
      axisLabel: {color: theme.quiet, fontFamily: FONT, hideOverlap: true,
                  showMinLabel: false, showMaxLabel: false},
    }),
    yAxis: axis(theme, 'voltage, V', {
      min: LOWEST * height, max: HIGHEST * height, nameGap: 32,
      splitLine: {show: false}, axisTick: {show: false},
      axisLine: {onZero: false, lineStyle: {color: theme.quiet}},
      axisLabel: {color: theme.quiet, fontFamily: FONT, customValues: ticks},
    }),
    series: [
      levelLines(wave, theme),
      ...wave.nets.map(({line}, i) => ({
        type: 'line', silent: true, showSymbol: false, z: 3, data: line,
        lineStyle: {color: theme.ink, width: isOutput(i) ? 2.25 : 1.5,
                    type: isOutput(i) ? 'solid' : [6, 4]},
      })),
      bracketSeries(wave, theme),
      ...crossingSeries(wave, theme),
      nameSeries(wave, theme),
    ],
  });
}

function showWaves() {
  for (const wave of waves) {
    const figure = element(`waves-${wave.place + 1}`);
    const caption = figure.querySelector('figcaption').textContent;
    const chart = make('div', {className: 'chart waves'});
    chart.setAttribute('role', 'img');
    chart.setAttribute('aria-label',
        `Voltage of input and output over time: ${caption}`);
    figure.querySelector('details').before(chart);
    addChart(chart, waveOptions(wave), {half: true});
  }
}
