// A record as plain text, for tests: its blocks and running text without marks of how they look.

import type { RecordTree } from '../../src/record/index.ts';

const RUNNING: ReadonlySet<unknown> = new Set(['text', 'strong', 'name', 'entry', 'formula', 'blank']);
const SHOWN: ReadonlySet<string> = new Set(['title', 'remark', 'unit', 'role', 'label', 'number']);
/** Drawings have texts of their own, and the sheet text says everything once more. */
const SKIPPED: ReadonlySet<string> = new Set(['svg', 'lines', 'tex']);

/** Every text under a node of the record in reading order. */
export function textOf(node: unknown): string {
  return raw(node).replace(/\s+/g, ' ').trim();
}

/** The text of the section of that title. */
export function sectionText(tree: RecordTree, title: string): string {
  const section = tree.sections.find((each) => each.title === title);
  if (!section) throw new Error(`The record has no section ${title}.`);
  return textOf(section.blocks);
}

function raw(node: unknown): string {
  if (Array.isArray(node)) return node.map(raw).join(node.every(isRunning) ? '' : ' ');
  if (typeof node !== 'object' || node === null) return '';
  if ('text' in node && typeof node.text === 'string') return node.text;
  return Object.entries(node)
    .filter(([key]) => !SKIPPED.has(key))
    .map(([key, value]) => (SHOWN.has(key) && typeof value === 'string' ? value : raw(value)))
    .join(' ');
}

function isRunning(node: unknown): boolean {
  return typeof node === 'object' && node !== null && 'type' in node && RUNNING.has(node.type);
}
