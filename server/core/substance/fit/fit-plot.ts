// The plot of the fit's page: the phases with the largest residuals, each residual as a share of its limit on a logarithmic axis.
// Text of an SVG that reads on light and dark pages alike. Made from the residuals alone. Knows no files.
// Invariant: the same residuals give the same text.

import type { FitResiduals } from '../phase-fit.ts';
import { limits } from './equations.ts';

const rowsShown = 30;
const left = 190;
const width = 760;
const plotWidth = width - left - 30;
const rowHeight = 18;
const top = 52;
/** Shares of the limit at the ends of the axis; a residual beyond is drawn at the end. */
const lowest = 0.01;
const highest = 300;

const series = [
  { label: 'heat capacity', colour: '#c2571a', shape: 'circle', shareOf: heatCapacityShare },
  { label: 'enthalpy', colour: '#2f7fb5', shape: 'square', shareOf: enthalpyShare },
  { label: 'G/RT', colour: '#4c9a4f', shape: 'triangle', shareOf: gibbsShare },
] as const;

/** The plot as SVG text. */
export function fitPlot(residuals: readonly FitResiduals[]): string {
  const worst = [...residuals]
    .sort((a, b) => largestShare(b) - largestShare(a) || (a.phase < b.phase ? -1 : 1))
    .slice(0, rowsShown);
  const height = top + worst.length * rowHeight + 34;
  const ticks = [0.01, 0.1, 1, 10, 100];
  const lines = [
    `<svg xmlns="http://www.w3.org/2000/svg" viewBox="0 0 ${width} ${height}" width="${width}" height="${height}" font-family="sans-serif" font-size="11">`,
    `<rect width="${width}" height="${height}" fill="#fdfcf9"/>`,
    `<text x="${left}" y="18" font-size="13" fill="#222">Largest residuals as shares of their limits</text>`,
    ...series.map(({ label, colour, shape }, index) => {
      const x = left + index * 130;
      return `${marker(shape, x + 5, 35, colour)}<text x="${x + 14}" y="39" fill="#222">${label}</text>`;
    }),
    ...ticks.map((tick) => {
      const x = place(tick);
      const bottom = top + worst.length * rowHeight;
      const stroke = tick === 1 ? 'stroke="#a00" stroke-width="1.5"' : 'stroke="#ccc"';
      return `<line x1="${x}" y1="${top - 6}" x2="${x}" y2="${bottom}" ${stroke}/><text x="${x}" y="${bottom + 16}" text-anchor="middle" fill="#444">${tick === 1 ? 'limit' : tick}</text>`;
    }),
    ...worst.flatMap((row, index) => {
      const y = top + index * rowHeight + rowHeight / 2;
      return [
        `<text x="${left - 10}" y="${y + 4}" text-anchor="end" fill="#222">${row.phase}</text>`,
        ...series.map(({ shape, colour, shareOf }) => marker(shape, place(shareOf(row)), y, colour)),
      ];
    }),
    '</svg>',
  ];
  return `${lines.join('\n')}\n`;
}

function heatCapacityShare({ heatCapacityPercent }: FitResiduals): number {
  return heatCapacityPercent[0] / (limits.heatCapacityShare * 100);
}

function enthalpyShare({ enthalpyKJPerMol }: FitResiduals): number {
  return enthalpyKJPerMol[0] / limits.enthalpyKJ;
}

function gibbsShare({ gibbsOverRT }: FitResiduals): number {
  return gibbsOverRT[0] / limits.gibbsOverRT;
}

function largestShare(residuals: FitResiduals): number {
  return Math.max(...series.map(({ shareOf }) => shareOf(residuals)));
}

function place(share: number): number {
  const within = Math.min(highest, Math.max(lowest, share));
  return Math.round(left + (plotWidth * Math.log(within / lowest)) / Math.log(highest / lowest));
}

function marker(shape: 'circle' | 'square' | 'triangle', x: number, y: number, colour: string): string {
  if (shape === 'circle') return `<circle cx="${x}" cy="${y}" r="4" fill="${colour}"/>`;
  if (shape === 'square') return `<rect x="${x - 3.5}" y="${y - 3.5}" width="7" height="7" fill="${colour}"/>`;
  return `<path d="M${x} ${y - 4.5} l4.5 8 h-9 z" fill="${colour}"/>`;
}
