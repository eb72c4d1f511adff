// The values of a stage that stand beside its schematic, in the order in which a stage is read.

import { shownReading } from '../../record/index.ts';
import type { CellReading } from '../../sheet/index.ts';

interface StageValues {
  /** Voltages and the operating point. */
  readonly atRest: readonly StageValue[];
  /** Gain, resistances, swing, power. */
  readonly inMotion: readonly StageValue[];
}

export interface StageValue {
  readonly name: string;
  /** Number and unit; the unit is empty for plain numbers and words. */
  readonly number: string;
  readonly unit: string;
  readonly sentence: string;
}

const AT_REST = ['I_D', 'V_GS', 'V_ov', 'V_DS', 'V_DSsat', 'margin', 'region'];
const IN_MOTION = ['g_m', 'r_o', 'A_v', 'R_in', 'R_out', 'swing_up', 'swing_down', 'P_D'];
/** Taken for granted where it is tied to the source. */
const TIED = 'V_bulk';

export const NO_VALUES: StageValues = { atRest: [], inMotion: [] };

/** Those that the stage has a value for. */
export function stageValues(stage: CellReading): StageValues {
  const value = (name: string): unknown => stage.values.find((each) => each.name === name)?.value;
  const voltages = stage.values
    .map(({ name }) => name)
    .filter(
      (name) => /^V_[a-z]/.test(name) && name !== 'V_ov' && !(name === TIED && value(TIED) === value('V_source')),
    );
  const rows = (names: readonly string[]): StageValue[] =>
    names.flatMap((name) => {
      const reading = stage.values.find((each) => each.name === name);
      const text = reading ? shownReading(reading) : null;
      if (!reading || text === null) return [];
      const [number, ...unit] = text.split(' ');
      return [{ name, number: number!, unit: unit.join(' '), sentence: reading.sentence }];
    });
  return { atRest: rows([...voltages, ...AT_REST]), inMotion: rows(IN_MOTION) };
}
