import { benchMerge } from './merge-bench.ts';
import { findingsTable, table } from './print.ts';
import { hangUp } from './wire.ts';

const { findings, spending } = await benchMerge();
console.log(findingsTable(findings));
console.log(table([["part", "ms"], ...[...spending].map(([part, ms]) => [part, ms.toFixed(2)])]));
hangUp();
