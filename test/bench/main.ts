// Times the engine beside hand-written code and a general library; each ratio stands beside its target.

import { benchCells } from './cells/bench.ts';
import { benchOneStage } from './one-stage/bench.ts';
import { benchPaint } from './paint/bench.ts';
import { benchRoot } from './root/bench.ts';

for (const bench of [benchOneStage, benchRoot, benchCells]) for (const table of bench()) console.log(`${table}\n`);
for (const table of await benchPaint()) console.log(`${table}\n`);
