// The table of arcs of two runs: what its columns sort by, and its filters.
'use strict';

// An arc's figure; see harness/page/versus_data.h.
const IN_A = 0, IN_B = 1, CHANGE = 2, CHANGE_EXPANDED = 3;
const FINDINGS = ['same jobs', 'alike', 'uncertainty unknown', 'not measured',
                  'bent, other fanouts', 'changed'];

const SORT_KEYS = {
  cell: cellOf, arc: arc => arc.n, corner: cornerOf,
  g0: arc => arc.g[IN_A], g1: arc => arc.g[IN_B], g2: arc => arc.g[CHANGE],
  p0: arc => arc.p[IN_A], p1: arc => arc.p[IN_B], p2: arc => arc.p[CHANGE],
  finding: arc => FINDINGS.indexOf(arc.f),
};

function passing() {
  const cell = element('filter-cell').value.trim().toLowerCase();
  const corner = element('filter-corner').value;
  const edge = element('filter-edge').value;
  const finding = element('filter-finding').value;
  return rows.map((row, i) => i).filter(i => {
    const arc = data.arcs[i];
    return (!cell || cellOf(arc).toLowerCase().includes(cell)) &&
        (!corner || arc.k === Number(corner)) && (!edge || arc.e === edge) &&
        (!finding || (finding === 'verdicts differ' ? arc.d
                                                    : arc.f === finding));
  });
}

function showCell(i) {
  element('filters').reset();
  element('filter-cell').value = cellOf(data.arcs[i]);
  limit = ROWS_AT_ONCE;
  // The form's own reset shows all rows, and does so later.
  setTimeout(showRows);
  element('arcs').scrollIntoView();
}
