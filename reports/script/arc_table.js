// The table of arcs of a run: what its columns sort by, and its filters.
'use strict';

const VERDICTS = ['within', 'not measured', 'beyond'];
const SORT_KEYS = {
  cell: cellOf, arc: arc => arc.n, corner: cornerOf,
  g0: arc => arc.g[HAND], g1: arc => arc.g[MEASURED],
  g3: arc => arc.g[DIFFERENCE],
  p0: arc => arc.p[HAND], p1: arc => arc.p[MEASURED],
  p3: arc => arc.p[DIFFERENCE],
  verdict: arc => VERDICTS.indexOf(arc.v),
};

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
