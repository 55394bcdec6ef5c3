// Starts the parts of a run's page.
'use strict';

let planWasOpen = false;

function unfoldPlan(printBegins) {
  planWasOpen = printBegins ? element('plan').open : planWasOpen;
  element('plan').open = printBegins || planWasOpen;
}

prepareTable();
showDifferences();
preparePictures();
showWaves();
showArcOfHash();
redrawWhenNeeded(unfoldPlan);
