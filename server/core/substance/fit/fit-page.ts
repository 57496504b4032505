// The generated page of the fit: what was fitted and how, the species over the limits with their reasons, the worst of all in a
// plot, the ends kept by hand, and every phase's residuals. Made from records and residuals alone, so a test can tell when it is stale.
// Knows no files and no tables. Invariant: one line a phase, in the order of ids.

import type { FitResiduals, PhaseFit, PhaseLimit, WorstResidual } from '../phase-fit.ts';
import { limits } from './equations.ts';
import { overLimits } from './fit-tables.ts';
import { reasonsOverLimits } from './remarks.ts';

/** The page as Markdown; `plotFile` is the name of the plot beside it. */
export function fitPage(
  records: readonly PhaseFit[],
  residuals: readonly FitResiduals[],
  phaseLimits: readonly PhaseLimit[],
  plotFile: string,
): string {
  const sorted = [...records].sort((a, b) => (a.id < b.id ? -1 : 1));
  const byPhase = new Map(residuals.map((each) => [each.phase, each]));
  const over = residuals.filter((each) => overLimits(each).length > 0);
  const pieces = sorted.reduce((sum, record) => sum + record.pieces.length, 0);
  const terms = sorted.flatMap((record) => record.pieces).reduce((sum, piece) => sum + piece.terms.length, 0);
  const count = (phase: string): number => sorted.filter((record) => record.phase === phase).length;
  return `# Fit of the thermochemical data

This page is written by \`npm run fit\`; edits are lost.

Source: M. W. Chase Jr., NIST-JANAF Thermochemical Tables, 4th ed., J. Phys. Chem. Ref. Data Monograph 9 (1998), 0.1 MPa.
Heat capacity, enthalpy and entropy of each phase are fitted together: cp/R is a sum of powers of t = T/1000 K from t^-2 to
t^4 in as few pieces as keep every residual within half its limit, with as few terms as do. Enthalpy and entropy are its integrals from
298.15 K, where enthalpy, entropy and heat capacity are those of the table. Transitions and peaks of the heat capacity are
joins; at other joins heat capacity is continuous. Where two phases of one composition meet, both have the same Gibbs energy.

${sorted.length} phases (${count('g')} gas, ${count('l')} liquid, ${count('cr')} crystal), ${pieces} pieces, ${terms} terms.

| against every row of the tables from 200 K | limit | worst | half of all phases below |
| --- | --- | --- | --- |
${summaryRow(residuals, 'heat capacity, %', limits.heatCapacityShare * 100, (each) => each.heatCapacityPercent)}
${summaryRow(residuals, 'enthalpy, kJ/mol', limits.enthalpyKJ, (each) => each.enthalpyKJPerMol)}
${summaryRow(residuals, 'G/RT, where stable', limits.gibbsOverRT, (each) => each.gibbsOverRT)}

## Over the limits

${over.length === 0 ? 'None.' : over.map(overLine).join('\n')}

## The worst

![The phases with the largest residuals, as shares of their limits](${plotFile})

## Ends kept by hand

Crystals without a liquid among the data, and where they really end. A decomposition is that at 1 bar.

| phase | K | what happens | source | |
| --- | --- | --- | --- | --- |
${[...phaseLimits]
  .sort((a, b) => (a.phase < b.phase ? -1 : 1))
  .map(limitRow)
  .join('\n')}

## Remarks

${sorted
  .filter(hasRemark)
  .map(
    (record) =>
      `- **${record.id}**: ${[record.leftOut === undefined ? undefined : `left out of searches: ${record.leftOut}`, record.note].filter((text) => text !== undefined).join('; ')}.`,
  )
  .join('\n')}

## All phases

Largest residual and its temperature in K.

| phase | table | K | pieces | cp, % | H, kJ/mol | G/RT |
| --- | --- | --- | --- | --- | --- | --- |
${sorted.map((record) => phaseRow(record, byPhase.get(record.id))).join('\n')}
`;
}

type ResidualOf = (residuals: FitResiduals) => WorstResidual;

function summaryRow(residuals: readonly FitResiduals[], label: string, limit: number, residualOf: ResidualOf): string {
  const byResidual = [...residuals].sort((a, b) => residualOf(b)[0] - residualOf(a)[0]);
  const [worst] = byResidual;
  const median = byResidual[Math.floor(byResidual.length / 2)];
  if (worst === undefined || median === undefined) return '';
  return `| ${label} | ${limit} | ${residualOf(worst)[0]} (${worst.phase}, ${residualOf(worst)[1]} K) | ${residualOf(median)[0]} |`;
}

function overLine(residuals: FitResiduals): string {
  return `- **${residuals.phase}**: ${overLimits(residuals).join(', ')}. Why: ${reasonsOverLimits[residuals.phase] ?? 'no reason given'}.`;
}

function limitRow({ phase, atK, event, products, source, provenance }: PhaseLimit): string {
  const into = products === undefined ? '' : ` (${Object.keys(products).join(', ')})`;
  return `| ${phase} | ${atK} | ${event}${into} | ${source} | ${provenance} |`;
}

function hasRemark({ leftOut, note }: PhaseFit): boolean {
  return leftOut !== undefined || note !== undefined;
}

function phaseRow(record: PhaseFit, residuals: FitResiduals | undefined): string {
  const cell = (worst: WorstResidual | undefined): string => (worst === undefined ? '' : `${worst[0]} at ${worst[1]}`);
  const range = `${record.pieces[0]?.fromK ?? ''}–${record.toK}`;
  return `| ${record.id} | ${record.table} | ${range} | ${record.pieces.length} | ${cell(residuals?.heatCapacityPercent)} | ${cell(residuals?.enthalpyKJPerMol)} | ${cell(residuals?.gibbsOverRT)} |`;
}
