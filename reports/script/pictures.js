// Delay against fanout: a picture an arc, of the arcs chosen or linked to.
'use strict';

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

// In the words of the table, so that no number is rounded twice.
function figureText(i) {
  const texts = [...rows[i].cells].map(cell => cell.textContent);
  const one = (name, at) =>
      `${name} ${texts[at + 1]}, by hand ${texts[at]}, ${texts[at + 2]}`;
  return (data.arcs[i].l
      ? `${one('g', 3)}; ${one('p', 6)}`
      : `by hand g ${texts[3]}, p ${texts[6]}`).replaceAll(' %', '\u00a0%');
}

function picture(i) {
  const arc = data.arcs[i];
  const name = `${cellOf(arc)} ${arc.n}`;
  const chart = make('div', {className: 'chart'});
  chart.setAttribute('role', 'img');
  chart.setAttribute('aria-label', `Delay of ${name} against fanout, ` +
      `${arc.x.length} points. ${figureText(i)}. ${arc.v}.`);
  const verdict = make('span', {
    className: arc.v === 'not measured' ? 'unmeasured' : arc.v,
    textContent: arc.v,
  });
  const caption = make('figcaption', {},
      make('strong', {}, make('bdi', {textContent: name})),
      `at ${cornerOf(arc)}${arc.s ? `, with ${arc.s}` : ''}: `, verdict,
      `${arc.b ? ', bent' : ''}. ${figureText(i)}.`);
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
  return data.arcs.map((arc, i) => [Math.abs(arc.g[DIFFERENCE]), i])
      .filter(([, i]) => data.arcs[i].v !== 'not measured')
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
  cells.append(
      make('option', {value: '', textContent: 'the largest differences'}));
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
