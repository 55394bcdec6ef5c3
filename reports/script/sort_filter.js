// Sorting and filtering of a table of arcs, whose rows are in the page. What
// the columns sort by, SORT_KEYS, and which rows are wanted, passing(), is each
// page's own.
'use strict';

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

const order = {key: null, direction: 1};
let limit = ROWS_AT_ONCE;

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
