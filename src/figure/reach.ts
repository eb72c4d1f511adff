// How far the horizontal wires of a schematic's nodes reach while pieces are fastened to them.

import type { Side } from './topology.ts';

export class Reach {
  readonly #ends = new Map<string, number>();
  /** All x at which something meets the wire of a node. */
  readonly #touched = new Map<string, number[]>();

  /** Something meets the node's wire at x. */
  touch(node: string, side: Side, x: number): void {
    this.#touched.set(node, [...(this.#touched.get(node) ?? []), x]);
    const before = this.#ends.get(`${node} ${side}`) ?? x;
    this.extend(node, side, side === 'left' ? Math.min(before, x) : Math.max(before, x));
  }

  /** The next piece goes beyond x, though the wire need not go there. */
  extend(node: string, side: Side, x: number): void {
    this.#ends.set(`${node} ${side}`, x);
  }

  /** Where the node's wire ends on a side so far. */
  of(node: string, side: Side): number {
    return this.#ends.get(`${node} ${side}`) ?? this.#touched.get(node)?.[0] ?? 0;
  }

  knows(node: string): boolean {
    return this.#touched.has(node);
  }

  /** The wires that follow, one for each node. */
  spans(): { readonly node: string; readonly from: number; readonly to: number }[] {
    return [...this.#touched].map(([node, xs]) => ({ node, from: Math.min(...xs), to: Math.max(...xs) }));
  }
}
