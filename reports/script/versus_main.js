// Starts the parts of the page of two runs.
'use strict';

prepareTable();
showChanges();
redrawWhenNeeded();
