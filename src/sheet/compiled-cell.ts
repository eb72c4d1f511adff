// A cell as it was compiled: its code, what others see of it, and what it rests on beside their interfaces.

import type { CellTree } from '../language/index.ts';
import type { Segment } from '../program/index.ts';
import type { Handle } from '../network/index.ts';
import type { AskDraft, Draft, Placed } from './draft.ts';
import type { Interface } from './interface.ts';
import type { EndName } from './scope.ts';

/** The least or largest of the value in a slot, wanted in another slot. */
interface WantedEnd {
  readonly which: EndName;
  readonly of: number;
  readonly into: number;
}

/** What an inverse cell asks, by slots. */
export type AskedSlots = Pick<AskDraft, 'cell' | 'input' | 'residual' | 'low' | 'high' | 'held' | 'answer' | 'each'>;

export interface CompiledCell {
  readonly draft: Draft;
  readonly segment: Segment;
  readonly slot: (handle: Handle) => number;
  readonly interface: Interface;
  /** What the user wrote wrongly; the cell has no value then. */
  readonly fault: Placed | null;
  /** Understood, but not computed by now. */
  readonly later: Placed | null;
  /** A cell whose type is not settled and is needed here. */
  readonly waitsFor: string | null;
  /** Every cell that was looked up and the interface it had. */
  readonly seen: Map<string, Interface | null>;
  /** The names of all cells, where something was proposed from them. */
  readonly proposedFrom: readonly string[] | null;
  /** Ends of values that are put into slots before the cell runs for good. */
  readonly ends: readonly WantedEnd[];
  /** Slots of what an inverse cell asks; null for another cell. */
  readonly asks: AskedSlots | null;
  /** Every cell whose text was taken over. */
  readonly copied: ReadonlyMap<string, CellTree | null>;
  /** The names of all inputs, likewise. */
  readonly proposedInputs: readonly string[] | null;
  /** Names whose mere presence was asked for. */
  readonly presence: Map<string, boolean>;
  /** The cells whose code was taken over, and that code. */
  readonly taken: ReadonlyMap<{ readonly compiled: { readonly segment: Segment } }, Segment>;
  /** What was compiled rests on values as they stood, not on kinds alone. */
  readonly restsOnValues: boolean;
  readonly shape: string | null;
}
