import type { Finding } from './measuring.ts';

const HEAD = ['bench', 'bare ms', 'ours ms', 'ratio', 'goal', ''];

/** The findings as a table of plain text. */
export function findingsTable(findings: Finding[]): string {
  return table([HEAD, ...findings.map(findingLine)]);
}

function findingLine({ what, bareMs, oursMs, goal }: Finding): string[] {
  const ratio = oursMs / bareMs;
  const verdict = goal === null ? '' : ratio <= goal ? 'met' : 'not met';
  return [what, bareMs.toFixed(2), oursMs.toFixed(2), ratio.toFixed(2), goal === null ? '' : `<= ${goal}`, verdict];
}

/** Lines of cells under one another; all but the first column to the right. */
export function table(lines: string[][]): string {
  const widths = lines[0]!.map((_, column) => Math.max(...lines.map((line) => line[column]!.length)));
  const padded = lines.map((line) => line.map((cell, column) => (column === 0 ? cell.padEnd(widths[column]!) : cell.padStart(widths[column]!))));
  return padded.map((cells) => cells.join('  ').trimEnd()).join('\n');
}
