// What a schematic is drawn from: one FET, the places of its stage and what hangs on them, with every
// number already put into words. Plain data, so that a sheet, a test and an insert dialog can all give it.

/** What a leg holds; `tie` is no element at all. */
export type LegKind = 'resistor' | 'capacitor' | 'inductor' | 'source' | 'tie';

/** Where a leg ends. A signal is named `signal` or `-signal`. */
export interface LegEnd {
  readonly kind: 'node' | 'rail' | 'signal' | 'common';
  /** Name of the node, or how the rail is called: `V_DD`, `0 V`. */
  readonly name: string;
  /** Volts of a rail; null where it has no value. */
  readonly volts: number | null;
  /** The rail's voltage in words, shown behind its name; '' where the name says it. */
  readonly value: string;
}

export interface StageLeg {
  /** The place on whose line the leg stands. */
  readonly from: string;
  readonly kind: LegKind;
  /** `R_S`, or '' for an element without a name. */
  readonly label: string;
  /** `1.2 kΩ`, or ''. */
  readonly value: string;
  /** A source that drives from the far end into `from`. */
  readonly reversed: boolean;
  readonly to: LegEnd;
  /** The cell that the symbol leads to, or null. */
  readonly cell: string | null;
  /** Whether a check that fails now names it. */
  readonly fails?: boolean;
}

export interface SchematicInput {
  /** Name of the stage, for the title. */
  readonly name: string;
  readonly channel: 'n' | 'p';
  readonly family: 'JFET' | 'MOSFET';
  readonly enhancement: boolean;
  readonly fetName: string;
  readonly fetCell: string | null;
  /** Named nodes in sheet order; terminals may be among them. */
  readonly nodes: readonly string[];
  readonly legs: readonly StageLeg[];
  /** Voltage of a node in words, by name; null or absent where there is none. */
  readonly voltages: Readonly<Record<string, string | null>>;
  /** Channel current in words. */
  readonly current: string | null;
  /** Places where gain is taken; none, one or two. */
  readonly output: readonly string[];
}
