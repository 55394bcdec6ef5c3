// The page's data and what all parts of the scripts share.  `data` is described
// in harness/page/page_data.h, that of two runs in versus_data.h.
'use strict';

const data = JSON.parse(document.getElementById('data').textContent);
const element = id => document.getElementById(id);
const HAND = 0, MEASURED = 1, DIFFERENCE = 3, EXPANDED = 4, ALLOWED = 5;
const FONT = '"Segoe UI", Roboto, "Noto Sans", "DejaVu Sans", sans-serif';
// Whiskers on more arcs than this hide the marks and take seconds to draw.
const MOST_WHISKERS = 400;
const MOST_WORST = 6;
const ROWS_AT_ONCE = 200;
const PRINT_WIDTH = 690, PRINT_HALF = 335;

const table = element('arc-table');
const rows = [...table.tBodies].flatMap(body => [...body.rows]);

const cellOf = arc => data.cells[arc.c];
const cornerOf = arc => data.corners[arc.k];
const percent = ratio =>
  `${ratio < 0 ? '' : '+'}${Number((100 * ratio).toPrecision(6))}\u00a0%`;
const shortened = (text, most) =>
  text.length > most ? `${text.slice(0, most - 1)}\u2026` : text;

function make(tag, properties, ...children) {
  const node = Object.assign(document.createElement(tag), properties);
  node.append(...children);
  return node;
}
