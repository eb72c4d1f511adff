// Values of a sheet in many builds or positions at once, in columns; what an inverse cell answers is found in each of them.
//
// An inverse cell is answered by columns of its own in which its input is turned, too: the whole scan for all rows together,
// then each row narrows its own bracket in step with the others. Where an inner inverse cell or a choice depends on what is
// turned, it is answered and chosen anew there.

import { createNarrowing, isRoot, scanPlaces, scanRoots } from '../numeric/index.ts';
import type { Narrowing } from '../numeric/index.ts';
import { createColumns, planColumns, reachOf, reaches, resultsOf, runAll } from '../program/index.ts';
import { KERNELS, isChoice } from '../sheet/index.ts';
import type { Asked, SpreadModel } from '../sheet/index.ts';

interface StateColumns {
  /** Rows of one pass. */
  readonly width: number;
  /** The column of the k-th slot that varies: the caller fills it; it stays as it is. */
  input(k: number): Float64Array;
  /** The column of the k-th wanted slot. */
  output(k: number): Float64Array;
  /** Computes the first `count` rows. */
  run(count: number): void;
}

/** What was chosen at the nominal values: the same in every build. */
export function choicesOf({ program }: Pick<SpreadModel, 'program'>): number[] {
  return resultsOf(program, isChoice);
}

/** Columns of the slots in `outputs` over those in `varying`; what was chosen at the nominal values stays. */
export function createStateColumns(
  model: SpreadModel,
  varying: readonly number[],
  outputs: readonly number[],
): StateColumns {
  return columnsWith(model, varying, outputs, choicesOf(model));
}

function columnsWith(
  model: SpreadModel,
  varying: readonly number[],
  outputs: readonly number[],
  frozen: readonly number[],
): StateColumns {
  const { program, slots } = model;
  const answered = neededAnswers(model, varying, outputs, frozen);
  const plan = planColumns({
    program,
    slots,
    varying: [...varying, ...answered.map(({ answer }) => answer)],
    frozen,
    outputs,
  });
  const columns = createColumns(plan, KERNELS);
  const solvers = answered.map((asked) => createSolver(model, asked, varying, frozen));
  const width = Math.min(columns.width, ...solvers.map((solver) => solver.width));
  const { input, output } = columns;
  return {
    width,
    input,
    output,
    run(count) {
      solvers.forEach((solver, n) => solver.solve(count, input, input(varying.length + n)));
      columns.run(count);
    },
  };
}

/** The inverse cells that vary and on which an output rests. */
function neededAnswers(
  model: SpreadModel,
  varying: readonly number[],
  outputs: readonly number[],
  frozen: readonly number[],
): Asked[] {
  const open = model.asked.filter(({ isSame }) => !isSame);
  if (open.length === 0) return [];
  const cut = new Set(frozen);
  const moved = reachOf(model.program, varying, cut);
  const used = reachOf(
    model.program,
    open.map(({ answer }) => answer),
    cut,
  );
  return open.filter(
    ({ answer, residual }, n) =>
      varying.some((_, k) => reaches(moved, k, residual)) &&
      outputs.some((slot) => slot === answer || reaches(used, n, slot)),
  );
}

/** No step of the scan. */
const NONE = -1;

interface Solver {
  readonly width: number;
  /** The answer of each row, NaN where there is none or more than one; `input(k)` are the columns that vary. */
  solve(count: number, input: (k: number) => Float64Array, answers: Float64Array): void;
}

function createSolver(
  model: SpreadModel,
  { input: turned, residual, low, high }: Asked,
  varying: readonly number[],
  frozen: readonly number[],
): Solver {
  const others = varying.flatMap((slot, k) => (slot === turned ? [] : [k]));
  const isTurned = reachOf(model.program, [turned], new Set());
  const inner = columnsWith(
    model,
    [...others.map((k) => varying[k]!), turned],
    [residual],
    frozen.filter((slot) => !reaches(isTurned, 0, slot)),
  );
  const { width } = inner;
  const x = inner.input(others.length);
  const y = inner.output(0);
  const places = scanPlaces(low, high);
  const [last, latest] = [new Float64Array(width), new Float64Array(width)];
  const roots = new Int32Array(width);
  const hides = new Uint8Array(width);
  const step = new Int32Array(width);
  const [atLow, atHigh] = [new Float64Array(width), new Float64Array(width)];
  const rows: Narrowing[] = [];

  /** Answers one row by itself; the columns of the first row are lost. */
  function alone(row: number, input: (k: number) => Float64Array): number {
    others.forEach((k, n) => (inner.input(n)[0] = input(k)[row]!));
    const f = (at: number): number => {
      x[0] = at;
      inner.run(1);
      return y[0]!;
    };
    const found = scanRoots(f, low, high);
    return found.roots.length === 1 && !found.isConstant ? found.roots[0]! : NaN;
  }

  /** Walks all rows over the range: counts the roots of each, notes the step of the last one, and where one may hide at the border of what is known. */
  function scan(count: number, answers: Float64Array): void {
    roots.fill(0, 0, count);
    step.fill(NONE, 0, count);
    hides.fill(0, 0, count);
    for (let i = 0; i < places.length; i++) {
      x.fill(places[i]!, 0, count);
      inner.run(count);
      for (let row = 0; row < count; row++) {
        const [earlier, before, now] = [last[row]!, latest[row]!, y[row]!];
        last[row] = before;
        latest[row] = now;
        if (now === 0) {
          roots[row]!++;
          step[row] = NONE;
          answers[row] = places[i]!;
          continue;
        }
        if (i === 0) continue;
        if (now === now && before === before) {
          if (before !== 0 && before > 0 !== now > 0) {
            roots[row]!++;
            step[row] = i;
            atLow[row] = before;
            atHigh[row] = now;
          }
          // The first step behind a border, walking away from 0.
          if (i > 1 && earlier !== earlier && Math.abs(now) > Math.abs(before)) hides[row] = 1;
        } else if (before === before && (i === 1 || !(Math.abs(before) > Math.abs(earlier)))) hides[row] = 1;
      }
    }
  }

  return {
    width,
    solve(count, input, answers) {
      others.forEach((k, n) => inner.input(n).set(input(k).subarray(0, count)));
      scan(count, answers);
      let open = 0;
      for (let row = 0; row < count; row++) {
        const narrowing = (rows[row] ??= createNarrowing());
        if (roots[row] !== 1) {
          answers[row] = NaN;
          step[row] = NONE;
        }
        const i = step[row]!;
        if (i === NONE) continue;
        narrowing.start(places[i - 1]!, atLow[row]!, places[i]!, atHigh[row]!);
        open++;
      }
      while (open > 0) {
        for (let row = 0; row < count; row++) x[row] = step[row] === NONE ? low : rows[row]!.next;
        inner.run(count);
        for (let row = 0; row < count; row++) {
          const narrowing = rows[row]!;
          if (step[row] === NONE || narrowing.status !== null) continue;
          narrowing.take(y[row]!);
          if (narrowing.status !== null) open--;
        }
      }
      for (let row = 0; row < count; row++) {
        if (step[row] === NONE) continue;
        const { value, status, residual: left } = rows[row]!.root;
        answers[row] = status !== 'left domain' && isRoot(left, atLow[row]!, atHigh[row]!) ? value : NaN;
      }
      for (let row = 0; row < count; row++) {
        if (roots[row] === 0 && hides[row] === 1) answers[row] = alone(row, input);
      }
    },
  };
}

/** The answers of the nominal state, in the order of the model, each put into the slots before the next one is looked for. */
export function answerAnew(model: SpreadModel): void {
  for (const asked of model.asked) {
    if (asked.isSame) continue;
    const columns = createSolver(model, asked, [], choicesOf(model));
    const answer = new Float64Array(columns.width);
    columns.solve(1, () => answer, answer);
    model.slots[asked.held] = answer[0]!;
    runAll(model.program, model.slots, KERNELS);
  }
}
