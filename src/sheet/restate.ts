// Values of the sheet in another state: `VALUE with INPUT = setting`. The code of every cell between the input and the value is
// taken over once more, with the setting in place of the input; what was chosen, and what was drawn, stays.

import type { PathExpr } from '../language/index.ts';
import type { Handle } from '../network/index.ts';
import type { Builder, Segment } from '../program/index.ts';
import { wayBetween } from './course.ts';
import type { Course } from './course.ts';
import type { Placed, Read } from './draft.ts';
import { staysChosen } from './kernels.ts';
import type { Node } from './node.ts';
import type { Typed } from './scope.ts';

/** Inputs with other values, by slot. */
export interface Setting {
  readonly node: Node;
  readonly slot: number;
  readonly handle: Handle;
}

/** Cells whose code was taken over. */
interface Restatement {
  readonly settings: readonly Setting[];
  readonly taken: Map<Node, Segment>;
  /** Where the values of the taken cells are now, by their own slots. */
  readonly placed: Map<number, Handle>;
}

export interface Restating {
  /** The same value in the state of these settings; `resolved` is what the path names as the sheet stands. */
  restate(path: PathExpr, resolved: Typed, settings: readonly Setting[]): Typed;
  /** The input that a path names. */
  setting(path: PathExpr, handle: Handle): Setting | null;
  /** Every cell whose code was taken over, and that code. */
  taken(): ReadonlyMap<Node, Segment>;
  /** What keeps a taken cell from having values in its other state. */
  fault(read: Read): Placed | null;
}

/** Takes code over into a builder. */
export function createRestating(builder: Builder, course: () => Course): Restating {
  const restatements: Restatement[] = [];

  function of(settings: readonly Setting[]): Restatement {
    const same = restatements.find(
      (each) =>
        each.settings.length === settings.length &&
        each.settings.every(({ slot, handle }, i) => slot === settings[i]!.slot && handle === settings[i]!.handle),
    );
    if (same) return same;
    const placed = new Map(settings.map(({ slot, handle }) => [slot, handle]));
    const fresh = { settings, taken: new Map<Node, Segment>(), placed };
    restatements.push(fresh);
    return fresh;
  }

  function take(node: Node, { taken, placed }: Restatement): void {
    if (taken.has(node)) return;
    const { segment } = node.compiled;
    taken.set(node, segment);
    builder.inline(segment, placed, staysChosen);
  }

  return {
    setting(path, handle) {
      const [first, ...rest] = path.names.map(({ name }) => name);
      const node = course().byName.get(first!);
      if (!node) return null;
      const { interface: own } = node.compiled;
      const input = rest.length === 0 ? own : own.offers.get(rest.join('.'));
      return input?.isInput ? { node, slot: input.slot, handle } : null;
    },
    restate(path, resolved, settings) {
      const present = course();
      const node = present.byName.get(path.names[0]!.name);
      if (!node) return resolved;
      const state = of(settings);
      const inputs = settings.map((setting) => setting.node);
      for (const each of [...wayBetween(inputs, node, present), ...(isMoved(node, inputs, present) ? [node] : [])]) {
        take(each, state);
      }
      return { type: resolved.type, handle: state.placed.get(resolved.handle) ?? resolved.handle };
    },
    taken: () => new Map(restatements.flatMap(({ taken }) => [...taken])),
    fault(read) {
      for (const { taken, placed } of restatements) {
        for (const { compiled } of taken.keys()) {
          const slotNow = (handle: Handle): Handle => placed.get(compiled.slot(handle)) ?? compiled.slot(handle);
          const fault = compiled.draft.verify?.((handle) => read(slotNow(handle)));
          if (fault) return fault;
        }
      }
      return null;
    },
  };
}

/** Whether a cell runs otherwise once these inputs are turned; a quantity that is turned itself has no code to run. */
function isMoved(node: Node, inputs: readonly Node[], course: Course): boolean {
  if (inputs.includes(node)) return node.tree.entry.type !== 'quantity';
  const { nodes } = course;
  return node.uses.some((u) => inputs.includes(nodes[u]!) || isMoved(nodes[u]!, inputs, course));
}
