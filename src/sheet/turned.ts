// The sheet with one input turned, on slots of its own, and the answers that inverse cells find so.
//
// Every cell on the way to a goal runs again, with the ends and answers that it asks for itself: an inverse cell may stand in
// another.

import { scanRoots } from '../numeric/index.ts';
import { runOperations } from '../program/index.ts';
import type { KernelTable } from '../program/index.ts';
import type { Answers } from './answers.ts';
import { wayBetween } from './course.ts';
import type { Course } from './course.ts';
import { KERNELS } from './kernels.ts';
import type { Node } from './node.ts';
import { createEndPutter, putEnds } from './put-ends.ts';

/** Inverse cells may stand in each other so deep. */
const DEEPEST = 3;

/** The one answer; NaN where there is none, or more than one. */
function theAnswer({ atAnswer, roots }: Answers): number {
  return atAnswer === null ? NaN : roots[0]!;
}

/** Runs a cell on slots, with what it asks for; gives what an inverse cell has found. */
export function runCell(node: Node, slots: Float64Array, course: Course): Answers | null {
  runToAsking(node, slots, course);
  const { asks } = node.compiled;
  if (asks === null) return null;
  const found = findAnswers(node, slots, course);
  slots[asks.held] = theAnswer(found);
  runCode(node, slots);
  return found;
}

/** Answers an inverse cell that is answered in every build, whose operations have run on these slots. */
export function answerAgain(node: Node, slots: Float64Array, course: Course, kernels: KernelTable): void {
  const { asks, segment } = node.compiled;
  slots[asks!.held] = theAnswer(findAnswers(node, slots, course));
  runOperations(segment.ops, 0, segment.ops.length, segment.args, 0, slots, kernels);
}

/** Runs a cell short of its own answer. */
function runToAsking(
  node: Node,
  slots: Float64Array,
  course: Course,
  put = (on: Float64Array): void => putEnds(node, on, course),
): void {
  runCode(node, slots);
  if (node.compiled.ends.length === 0) return;
  put(slots);
  runCode(node, slots);
}

function runCode({ compiled }: Node, slots: Float64Array): void {
  const { ops, args } = compiled.segment;
  runOperations(ops, 0, ops.length, args, 0, slots, KERNELS);
}

/** Looks for the answers of an inverse cell whose operations have run on these slots; they stay as they are. */
function findAnswers(node: Node, slots: Float64Array, course: Course): Answers {
  const asks = node.compiled.asks!;
  const [low, high] = [slots[asks.low]!, slots[asks.high]!];
  const nothing = { roots: [], jumps: [], atFirst: NaN, atLast: NaN, isConstant: false, atAnswer: null, low, high };
  if (!(Number.isFinite(low) && Number.isFinite(high) && low !== high)) return { ...nothing, obstacle: 'range' };
  if (depthOf(node, course) > DEEPEST) return { ...nothing, obstacle: 'depth' };
  const turned = turn({ node: course.byName.get(asks.cell)!, slot: asks.input }, node, slots, course);
  const residual = (x: number): number => (turned.at(x) ? turned.slots[asks.residual]! : NaN);
  const found = scanRoots(residual, low, high);
  const isOne = found.roots.length === 1 && !found.isConstant;
  if (isOne) residual(found.roots[0]!);
  return { ...found, obstacle: null, atAnswer: isOne ? turned.slots : null, low, high };
}

/** How many inverse cells stand in each other on the way from its input to a cell, itself included. */
function depthOf(node: Node, course: Course): number {
  const input = course.byName.get(node.compiled.asks!.cell)!;
  const inner = wayBetween([input], node, course).filter(({ compiled }) => compiled.asks !== null);
  return 1 + inner.reduce((deepest, each) => Math.max(deepest, depthOf(each, course)), 0);
}

/** An input: a quantity cell, or a part or point of which a field is turned; and the slot that is turned. */
interface TurnedInput {
  readonly node: Node;
  readonly slot: number;
}

interface Turned {
  readonly slots: Float64Array;
  /** Gives the input another value; says whether every cell on the way has values then. */
  at(x: number): boolean;
}

/** A copy of these slots on which an input is turned, with all that lies between it and the goal. */
export function turn(input: TurnedInput, goal: Node, slots: Float64Array, course: Course): Turned {
  const way = wayBetween([input.node], goal, course);
  const own = slots.slice();
  const put = goal.compiled.ends.length === 0 ? undefined : createEndPutter(goal, input.slot, course);
  return {
    slots: own,
    at(x) {
      own[input.slot] = x;
      for (const node of way) runCell(node, own, course);
      runToAsking(goal, own, course, put);
      return way.every((node) => isSound(node, own));
    },
  };
}

function isSound({ compiled }: Node, slots: Float64Array): boolean {
  const { verify } = compiled.draft;
  return !verify || verify((handle) => slots[compiled.slot(handle)]!) === null;
}
