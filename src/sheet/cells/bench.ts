// A bench: measured points of specimens, each fitted by the square law.
//
// Its rows are literal numbers, so everything is found where the cell is compiled; what it offers are constants.

import { benchCautions } from '../bench/cautions.ts';
import { benchColumns } from '../bench/columns.ts';
import { checkKept, fitSpecimens } from '../bench/fits.ts';
import { fittingReading } from '../bench/fitting.ts';
import { matchReading } from '../bench/matching.ts';
import { benchOffers } from '../bench/offers.ts';
import { benchRows } from '../bench/rows.ts';
import { benchSettings } from '../bench/settings.ts';
import { keptShare, measuredOf } from '../bench/summary.ts';
import { benchWorkings } from '../bench/workings.ts';
import { EMPTY_DRAFT } from '../draft.ts';
import type { CellContext, Draft } from '../draft.ts';

/** Compiles a bench cell. */
export function compileBenchCell({ tree, builder }: CellContext): Draft {
  const settings = benchSettings(tree);
  const rows = benchRows(tree, benchColumns(tree, settings.V_DS !== null), settings.V_DS);
  const { fitted: specimens, unfitted } = fitSpecimens(rows, settings);
  checkKept(specimens, settings);
  const measured = measuredOf(rows.channel, specimens, unfitted.length);
  const reading = {
    name: tree.name.name,
    channel: rows.channel,
    kept: settings.keep.length === 0 ? null : keptShare(measured),
    specimens: specimens.map((each) => each.reading),
    unfitted: unfitted.map(({ specimen: { name, rows: own }, text }) => ({ name, readings: own.length, text })),
    match: settings.match && matchReading(specimens, settings.match),
    fitting: settings.fitting && fittingReading(rows.channel, specimens, settings.fitting),
  };
  return {
    ...EMPTY_DRAFT,
    offers: benchOffers(reading, measured, builder),
    cautions: () => benchCautions(specimens, unfitted, settings),
    assumptions: [],
    workings: () => benchWorkings(tree.name.name, specimens, measured),
    bench: { measured, reading },
  };
}
