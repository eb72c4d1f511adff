// One run of the terminal entry, from its arguments to its exit status, without the process around it.

import { nearestNames, parseExpression } from '../language/index.ts';
import { samplingOf, verdictOf } from '../record/index.ts';
import { ANALYSES, analyse } from '../spread/index.ts';
import { createSheet } from '../sheet/index.ts';
import type { Sheet } from '../sheet/index.ts';
import { HELP, parseArguments, USAGE } from './arguments.ts';
import { EXIT, exitStatus } from './exit-status.ts';
import { jsonReport } from './json-report.ts';
import { readSheetFile } from './sheet-file.ts';
import { textReport } from './text-report.ts';
import { workingsReport } from './workings-report.ts';

export interface Surroundings {
  /** All bytes of a file, by the path as given; `-` is standard input. Throws what the system says. */
  readonly read: (file: string) => Uint8Array;
  readonly print: (text: string) => void;
  readonly complain: (text: string) => void;
  /** Characters in a line. */
  readonly width: number;
}

/**
 * Computes the sheet that `args` name and prints its report; returns the exit status. A fault of the program's own is
 * told with where it arose and has a status of its own, lest it be read as a check that fails.
 */
export function run(args: readonly string[], surroundings: Surroundings): number {
  try {
    return compute(args, surroundings);
  } catch (thrown) {
    const where = thrown instanceof Error ? (thrown.stack ?? thrown.message) : String(thrown);
    surroundings.complain(`The program failed; this says nothing of the sheet.\n${where}\n`);
    return EXIT.ownFault;
  }
}

function compute(args: readonly string[], { read, print, complain, width }: Surroundings): number {
  const call = parseArguments(args);
  if (call.kind === 'help') {
    print(HELP);
    return EXIT.holds;
  }
  if (call.kind === 'wrong') return refuse(call.text);

  const file = readSheetFile(call.file === '-' ? 'standard input' : call.file, () => read(call.file));
  if ('fault' in file) {
    complain(`${file.fault}\n`);
    return EXIT.notComputed;
  }
  const sheet = createSheet(file.text, ANALYSES);
  const name = call.workings === null ? null : cellName(sheet, call.workings);
  if (call.workings !== null && name === null) return refuse(unknownCell(sheet, call.workings));

  const asked = samplingOf(sheet.tree);
  const spread = analyse(sheet.spreadModel(), {
    samples: call.samples ?? asked.samples,
    seed: call.seed ?? asked.seed,
  });
  const judged = spread && { spread, leastYield: call.leastYield ?? asked.leastYield };
  if (call.json) print(`${JSON.stringify(jsonReport(sheet, name, judged), null, 2)}\n`);
  else print(name === null ? textReport(sheet, width, judged) : workingsReport(sheet, name, width));
  return exitStatus(verdictOf(sheet, judged));

  function refuse(text: string): number {
    complain(`${text}\n${USAGE}\n`);
    return EXIT.notComputed;
  }
}

/** The name of the cell that was meant, in any spelling of Greek letters; null where there is none. */
function cellName(sheet: Sheet, written: string): string | null {
  if (sheet.cell(written)) return written;
  const expr = parseExpression(written);
  if (!('type' in expr) || expr.type !== 'path' || expr.names.length > 1) return null;
  const { name } = expr.names[0]!;
  return sheet.cell(name) ? name : null;
}

function unknownCell(sheet: Sheet, written: string): string {
  const [owner] = written.split('.');
  if (owner !== written && sheet.cell(owner!))
    return `${written} is a value of ${owner}; name the cell: --workings ${owner}.`;
  const near = nearestNames(
    written,
    sheet.cells().map((cell) => cell.name),
  );
  return `There is no cell ${written}.${near.length > 0 ? ` Did you mean ${near.join(' or ')}?` : ''}`;
}
