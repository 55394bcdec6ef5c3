// Starts the parts, and draws anew for print, other colours and other widths.
'use strict';

let planWasOpen = false;

// A print has every chart, and the plan unfolded.
function print(begins) {
  printing = begins;
  planWasOpen = begins ? element('plan').open : planWasOpen;
  element('plan').open = begins || planWasOpen;
  for (const place of charts.keys()) {
    draw(place);
  }
}

prepareTable();
showDifferences();
preparePictures();
showArcOfHash();
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
