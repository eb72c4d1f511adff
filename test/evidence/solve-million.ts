// Holds the line solve against a million random extremes and every combination of special values, all judged in
// 32 digits. The code at its end is 1 when one answer was wrong. Another seed may be given.

import { judgeRandomLines, judgeSpecialLines } from '../support/line-oracle.ts';

const COUNT = 1_000_000;
const SHOWN = 10;

const seed = Number(process.argv[2] ?? 1);
if (!Number.isSafeInteger(seed)) throw new RangeError('The seed is a whole number.');
const random = judgeRandomLines(seed, COUNT);
console.log(`Random extremes, seed ${seed}: ${COUNT} solved, ${random.length} wrong.`);
const special = judgeSpecialLines();
console.log(`Combinations of special values: ${special.count} solved, ${special.faults.length} wrong.`);
const faults = [...random, ...special.faults];
for (const fault of faults.slice(0, SHOWN)) console.log(`  ${fault}`);
if (faults.length > SHOWN) console.log(`  and ${faults.length - SHOWN} more`);
process.exitCode = faults.length > 0 ? 1 : 0;
