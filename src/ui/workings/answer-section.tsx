// What an inverse cell answers can be put into the input it asks for: as it is shown, or the nearest value one can buy.

import { For, Show, createMemo } from 'solid-js';
import { formatValue } from '../../quantity/index.ts';
import type { CellReading } from '../../sheet/index.ts';
import type { Desk } from '../desk/index.ts';
import { nearestBuyable, setTurned, shownDigits, turnedNumber } from '../rows/index.ts';
import { Name } from '../typeset/index.ts';

/** One value that can be put in. */
interface Offer {
  readonly value: number;
  readonly text: string;
  /** What stands before the value: `the nearest E24 value, `. */
  readonly words: string;
}

/** The section of an inverse cell; nothing where it has no answer or its input has no number of its own. */
export function AnswerSection(props: { readonly desk: Desk; readonly cell: CellReading }) {
  const { desk } = props;
  // What is put in is the choice of the sheet itself, not that of the corner on which the page may stand.
  const asked = createMemo(() => {
    desk.document.version();
    const own = desk.document.sheet.cell(props.cell.name);
    if (!own) return null;
    const { entry } = own.tree;
    const value = own.reading?.value;
    if (entry.type !== 'inverse' || typeof value !== 'number' || !Number.isFinite(value)) return null;
    const [owner, ...label] = entry.input.names.map(({ name }) => name);
    const cell = desk.document.sheet.cell(owner!);
    if (!cell) return null;
    const field = cell.tree.fields.find((each) => each.label.map(({ name }) => name).join('.') === label.join('.'));
    const line = label.length === 0 ? cell.tree.line : field?.line;
    const turned = line && turnedNumber(desk.document.tree(), line.index, 'entry');
    return turned ? { input: [owner, ...label].join('.'), turned, value } : null;
  });
  const offers = createMemo((): Offer[] => {
    const found = asked();
    if (!found) return [];
    const { turned, value } = found;
    const text = (x: number): string => formatValue(x, turned.literal.kind, { zeros: 'drop' }).text;
    const asShown = shownDigits(turned, value);
    const buyable = nearestBuyable(turned, value);
    return [
      { value: asShown, text: text(asShown), words: '' },
      ...(buyable
        ? [{ value: buyable.value, text: text(buyable.value), words: `the nearest ${buyable.series} value, ` }]
        : []),
    ];
  });

  function putIn({ value, text }: Offer): void {
    const { input, turned } = asked()!;
    desk.document.edit(setTurned(turned, value), `put ${text} into ${input}`);
    desk.say(`${input} is ${text}.`, { title: 'Undo', run: () => desk.document.undo() });
  }

  return (
    <Show when={asked()}>
      {(found) => (
        <ul class="answer-offers">
          <For each={offers()}>
            {(offer) => (
              <li>
                <button type="button" class="link-button" onClick={() => putIn(offer)}>
                  put {offer.words}
                  {offer.text} into <Name path={found().input} />
                </button>
              </li>
            )}
          </For>
        </ul>
      )}
    </Show>
  );
}
