// Draws every chart anew for print, other colours and other widths.
'use strict';

// A print has every chart; `unfold` is told when it begins and when it ends.
function redrawWhenNeeded(unfold = () => {}) {
  const print = begins => {
    printing = begins;
    unfold(begins);
    for (const place of charts.keys()) {
      draw(place);
    }
  };
  matchMedia('(prefers-color-scheme: dark)')
      .addEventListener('change', redrawAll);
  addEventListener('beforeprint', () => print(true));
  addEventListener('afterprint', () => print(false));
  let width = innerWidth;
  addEventListener('resize', () => {
    if (innerWidth !== width && !printing) {
      width = innerWidth;
      redrawAll();
    }
  });
}
