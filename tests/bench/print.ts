import { median, type Figure, type Finding } from './measuring.ts';

const HEAD = ['bench', 'bare ms', 'ours ms', 'ratio', 'goal', ''];
const FIGURES_HEAD = ['bench', 'least', 'median', 'most', 'in', 'goal', ''];

/** The findings as a table of plain text: medians of all pairs. The ratio is that of pairs, since the machine may slow down between them. */
export function findingsTable(findings: Finding[]): string {
  return table([HEAD, ...findings.map(findingLine)]);
}

function findingLine({ what, pairs, goal }: Finding): string[] {
  const bareMs = median(pairs.map((pair) => pair.bareMs));
  const oursMs = median(pairs.map((pair) => pair.oursMs));
  const ratio = median(pairs.map((pair) => pair.oursMs / pair.bareMs));
  return [what, bareMs.toFixed(2), oursMs.toFixed(2), ratio.toFixed(2), `<= ${goal}`, ratio <= goal ? 'met' : 'not met'];
}

/** Figures that are no ratios. */
export function figuresTable(figures: Figure[]): string {
  return table([FIGURES_HEAD, ...figures.map(figureLine)]);
}

function figureLine({ what, unit, values, goal }: Figure): string[] {
  const value = median(values);
  const all = [Math.min(...values), value, Math.max(...values)].map((each) => each.toFixed(0));
  return [what, ...all, unit, `<= ${goal}`, value <= goal ? 'met' : 'not met'];
}

/** Lines of cells under one another; all but the first column to the right. */
export function table(lines: string[][]): string {
  const widths = lines[0]!.map((_, column) => Math.max(...lines.map((line) => line[column]!.length)));
  const pad = (cell: string, column: number) => (column === 0 ? cell.padEnd(widths[column]!) : cell.padStart(widths[column]!));
  return lines.map((line) => line.map(pad).join('  ').trimEnd()).join('\n');
}
