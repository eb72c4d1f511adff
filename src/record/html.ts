// The record's tree as HTML text. There is no style attribute and no script in it, and every text of the sheet is
// escaped. Formulas stand as text in elements with `data-tex`; whoever shows the page may have them typeset there.

import { escapeXml } from '../figure/index.ts';
import type { Run } from '../figure/index.ts';
import type {
  Block,
  Cell,
  Figure,
  Inline,
  Inlines,
  Mark,
  Person,
  RecordTree,
  Section,
  Step,
  TableRow,
} from './record-tree.ts';

const MARK_WORDS: Readonly<Record<Mark, string>> = {
  holds: 'holds',
  fails: 'fails',
  unknown: 'not decided',
  box: 'to be ticked',
};
/** Drawn, not a character of some face: ring with tick, disc with cross, dashed ring, box. */
const MARK_SHAPES: Readonly<Record<Mark, string>> = {
  holds:
    '<circle cx="7" cy="7" r="5.6" fill="none" stroke="#1d6a43" stroke-width="1.3"/><path d="M4.2 7.2L6.3 9.3L9.9 5" fill="none" stroke="#1d6a43" stroke-width="1.5"/>',
  fails:
    '<circle cx="7" cy="7" r="6.2" fill="#a8201a"/><path d="M4.6 4.6L9.4 9.4M9.4 4.6L4.6 9.4" fill="none" stroke="#ffffff" stroke-width="1.6"/>',
  unknown: '<circle cx="7" cy="7" r="5.6" fill="none" stroke="#1a1f24" stroke-width="1.3" stroke-dasharray="2 2"/>',
  box: '<rect x="2" y="2" width="10" height="10" fill="none" stroke="#1a1f24" stroke-width="1"/>',
};

/** The record as one `<article>`. */
export function recordHtml(tree: RecordTree): string {
  const incomplete = tree.incomplete === null ? '' : `<p class="record-incomplete">${inlines(tree.incomplete)}</p>`;
  return `<article class="record" lang="en">${titleBlock(tree)}${incomplete}${tree.sections.map(section).join('')}</article>`;
}

// ---------------------------------------------------------------- head

function titleBlock({ title, titleBlock: entries, digest, printedAt }: RecordTree): string {
  const fields = entries.map(({ field, label, content }) => entry(field, label, inlines(content)));
  const printed = printedAt === null ? '' : entry('printed', 'Printed', text(printedAt));
  return (
    `<header class="record-title"><div class="record-name"><p class="record-label">Calculation record</p><h1>${text(title)}</h1></div>` +
    `<dl>${fields.join('')}${printed}${entry('digest', 'SHA-256 of the sheet text', `<span class="record-digest">${groups(digest)}</span>`)}</dl></header>`
  );
}

function entry(field: string, label: string, content: string): string {
  return `<div class="record-field record-field-${field}"><dt>${text(label)}</dt><dd>${content}</dd></div>`;
}

/** In groups of eight, as they are compared by eye. */
function groups(digest: string): string {
  return text(digest.replace(/(.{8})(?=.)/g, '$1 '));
}

// ---------------------------------------------------------------- sections

function section({ number, title, remark, blocks }: Section): string {
  const behind = remark === '' ? '' : ` <span class="record-remark">${text(remark)}</span>`;
  const name = title.toLowerCase().replace(/[^a-z]+/g, '-');
  return `<section class="record-section record-section-${name}"><h2><span class="record-number">${text(number)}</span> ${text(title)}${behind}</h2>${blocks.map(block).join('')}</section>`;
}

function block(node: Block): string {
  switch (node.type) {
    case 'heading': {
      const remark = node.remark === '' ? '' : ` <span class="record-remark">${text(node.remark)}</span>`;
      return `<h3><span class="record-number">${text(node.number)}</span> ${inlines(node.content)}${remark}</h3>`;
    }
    case 'paragraph':
      return `<p class="record-${node.tone}">${inlines(node.content)}</p>`;
    case 'verdict':
      return `<p class="record-verdict record-${node.mark}">${mark(node.mark)}<span>${inlines(node.content)}</span></p>`;
    case 'list':
      return `<ul class="record-list">${node.items.map((item) => `<li>${node.mark === 'box' ? mark('box') : ''}<span>${inlines(item)}</span></li>`).join('')}</ul>`;
    case 'table':
      return table(node);
    case 'values':
      return `<dl class="record-values">${node.values.map(({ name, value }) => `<div><dt>${inline(name)}</dt>${valueParts(value)}</div>`).join('')}</dl>`;
    case 'stage': {
      const drawing = node.drawing === null ? '' : figure(node.drawing);
      const values = node.values === null ? '' : block(node.values);
      return `<div class="record-stage"><div>${drawing}${block(node.wiring)}</div><div>${values}</div></div>`;
    }
    case 'steps':
      return `<div class="record-steps">${node.steps.map(step).join('')}</div>`;
    case 'figures':
      return `<div class="record-figures">${node.figures.map(figure).join('')}</div>`;
    case 'sign-off':
      return signOff(node.people);
    case 'listing':
      return `<ol class="record-listing">${node.lines.map((line) => `<li><code>${text(line)}</code></li>`).join('')}</ol>`;
  }
}

// ---------------------------------------------------------------- tables

function table({ name, columns, rows }: Extract<Block, { readonly type: 'table' }>): string {
  const head = columns.map(({ title, head: set, kind }) => {
    const span =
      kind === 'number' ? ' colspan="2" class="record-amount"' : kind === 'right' ? ' class="record-right"' : '';
    return `<th scope="col"${span}>${set ? inlines(set) : text(title)}</th>`;
  });
  const body = rows.map((row) => tableRow(row, columns));
  return `<table class="record-table record-table-${name}">${columnGroup(columns)}<thead><tr>${head.join('')}</tr></thead><tbody>${body.join('')}</tbody></table>`;
}

function columnGroup(columns: Extract<Block, { readonly type: 'table' }>['columns']): string {
  const cols = columns.map(({ kind }) =>
    kind === 'number' ? '<col class="record-digits"><col class="record-unit">' : '<col>',
  );
  return `<colgroup>${cols.join('')}</colgroup>`;
}

function tableRow(row: TableRow, columns: Extract<Block, { readonly type: 'table' }>['columns']): string {
  const cells = row.cells.map((cell, at) => {
    const kind = columns[at]!.kind;
    const lead = at === 0 && row.mark !== null ? mark(row.mark) : '';
    const content = lead + inlines(cell.content);
    if (at === 0) return `<th scope="row">${content}</th>`;
    if (kind !== 'number') return `<td${kind === 'right' ? ' class="record-right"' : ''}>${content}</td>`;
    if (cell.unit === undefined) return `<td colspan="2" class="record-word">${content}</td>`;
    return `<td class="record-digits">${content}</td><td class="record-unit">${text(cell.unit)}</td>`;
  });
  return `<tr>${cells.join('')}</tr>`;
}

function valueParts({ content, unit }: Cell): string {
  if (unit === undefined) return `<dd class="record-word">${inlines(content)}</dd>`;
  return `<dd class="record-digits">${inlines(content)}</dd><dd class="record-unit">${text(unit)}</dd>`;
}

function signOff(people: readonly Person[]): string {
  const cell = (label: string, content: string): string =>
    `<td><span class="record-label">${text(label)}</span>${content}</td>`;
  const rows = people.map(
    ({ role, name, date }) =>
      `<tr><th scope="row">${text(role)}</th>${cell('Name', inlines(name))}${cell('Date', inlines(date))}${cell('Signature', inline({ type: 'blank' }))}</tr>`,
  );
  return `<table class="record-sign"><tbody>${rows.join('')}</tbody></table>`;
}

// ---------------------------------------------------------------- workings and figures

function step({ number, sentence, sides, agrees }: Step): string {
  const equation = sides.map(
    ({ tex, text: words, sign }) =>
      `<span class="record-side">${sign === '' ? '' : `<span class="record-sign-of">${sign}</span> `}${inline({ type: 'formula', tex, text: words })}</span>`,
  );
  const doubt = agrees ? '' : ' <strong>The digits shown do not give this result.</strong>';
  return (
    `<div class="record-step"><span class="record-step-number">${text(number)}</span>` +
    `<span class="record-step-words">${inlines(sentence)}</span><span class="record-equation">${equation.join(' ')}${doubt}</span></div>`
  );
}

function figure({ kind, svg, caption }: Figure): string {
  return `<figure class="record-figure record-${kind}">${svg}<figcaption>${inlines(caption)}</figcaption></figure>`;
}

function mark(kind: Mark): string {
  return `<svg class="record-mark" viewBox="0 0 14 14" width="14" height="14" role="img" aria-label="${MARK_WORDS[kind]}">${MARK_SHAPES[kind]}</svg>`;
}

// ---------------------------------------------------------------- running text

function inlines(parts: Inlines): string {
  return parts.map(inline).join('');
}

function inline(part: Inline): string {
  switch (part.type) {
    case 'text':
      return text(withUnits(part.text));
    case 'strong':
      return `<strong>${inlines(part.content)}</strong>`;
    case 'entry':
      return `<code>${text(part.text)}</code>`;
    case 'name':
      return `<span class="name">${part.runs.map(run).join('')}</span>`;
    case 'formula':
      return `<span class="record-formula" role="math" aria-label="${text(part.text)}" data-tex="${text(part.tex)}">${text(part.text)}</span>`;
    case 'blank':
      return '<span class="record-blank"></span>';
  }
}

function run({ text: words, style }: Run): string {
  if (style === 'upright') return text(words);
  return style === 'italic' ? `<i>${text(words)}</i>` : `<sub>${text(words)}</sub>`;
}

/** A number and its unit stay in one line. */
function withUnits(words: string): string {
  return words.replace(/(\d) (?=(?:[fpnµmkMG]?(?:V|A|Ω|F|H|W|S|s|Hz|K)|°C|%|dB)(?![A-Za-z]))/g, '$1\u00a0');
}

/** Characters that turn the direction of what follows or cannot be seen, which could make a record read otherwise. */
const HIDDEN = /[\u00ad\u061c\u180e\u200b-\u200f\u202a-\u202e\u2060-\u2069\ufeff]/g;

/** Escaped text; what cannot be seen is named by its number. */
function text(raw: string): string {
  const shown = raw.replace(
    HIDDEN,
    (character) => `⟨U+${character.codePointAt(0)!.toString(16).toUpperCase().padStart(4, '0')}⟩`,
  );
  return escapeXml(shown);
}
