// What the fitting run takes from this room: reading tables, fitting them, the page, the plot and the rows of the second fit.
// Knows no files; .ci/fit.mjs does. Never part of a bundle.

export { fitPage } from './fit-page.ts';
export { fitPlot } from './fit-plot.ts';
export { fitContext, fitTable, overLimits } from './fit-tables.ts';
export { fitHeldOut } from './held-out-rows.ts';
export { familyOf } from './phase-names.ts';
export { reasonsOverLimits } from './remarks.ts';
export { readSourceTable } from './source-table.ts';
