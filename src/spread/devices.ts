// The low and the high device of a stage: the specimens of its part at which the stage carries the least and the most
// current, everything else at its nominal.

import type { SpreadModel } from '../sheet/index.ts';
import { createBatch } from './batch.ts';
import type { DeclaredSet } from './declared-set.ts';
import { searchExtremes } from './extremes.ts';
import type { SearchEffort } from './extremes.ts';
import { whereIs } from './where.ts';
import type { StandingDraw } from './where.ts';

/** One device of a stage. */
interface Device {
  /** The draws of its part that stand away from their nominal. */
  readonly where: readonly StandingDraw[];
  /** Every value of the stage with this device, SI, by path. */
  readonly values: ReadonlyMap<string, number>;
}

export interface StageDevices {
  readonly stage: string;
  readonly part: string;
  readonly low: Device;
  readonly high: Device;
}

/** The devices of every stage whose part spreads. */
export function stageDevices(model: SpreadModel, effort: SearchEffort, set: DeclaredSet): StageDevices[] {
  return model.stages.flatMap(({ stage, part, current }) => {
    const isOfPart = (k: number): boolean => model.drawn[k]!.cell === part;
    if (!model.drawn.some((_, k) => isOfPart(k))) return [];
    const search = searchExtremes(model, [current], { effort, set, moving: isOfPart });
    const { low, high, unsolved } = search.of(0);
    if (search.isEmpty || unsolved !== null || low.value === high.value) return [];
    const wanted = model.values.filter(({ cell, type }) => cell === stage && typeof type !== 'string');
    const batch = createBatch(
      model,
      wanted.map(({ slot }) => slot),
    );
    const devices: Device[] = [];
    batch.run([low.position, high.position], (_, count) => {
      for (let i = 0; i < count; i++) {
        const { position } = i === 0 ? low : high;
        devices.push({
          where: whereIs(model, position, isOfPart),
          values: new Map(wanted.map(({ path }, k) => [path, batch.column(k)[i]!])),
        });
      }
    });
    return [{ stage, part, low: devices[0]!, high: devices[1]! }];
  });
}
