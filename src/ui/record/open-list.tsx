// What is open before the record can be issued, by kind; what stands in a cell leads there.

import { For, Show, createMemo } from 'solid-js';
import { openPoints } from '../../record/index.ts';
import type { OpenPoint } from '../../record/index.ts';
import type { Desk } from '../desk/index.ts';
import { Prose } from '../typeset/index.ts';

const KINDS: readonly (readonly [kind: OpenPoint['kind'], title: string])[] = [
  ['broken', 'Broken'],
  ['waiting', 'Without a value'],
  ['failing', 'Failing checks'],
  ['field', 'Title block'],
  ['assumed', 'Assumed, to be confirmed'],
  ['no source', 'Without a source'],
  ['taken', 'Taken by the sheet, to be confirmed'],
];

/** The list, or the sentence that nothing is open. `onFollow` is called once the cell is gone to. */
export function OpenList(props: { readonly desk: Desk; readonly onFollow: () => void }) {
  const { document } = props.desk;
  const points = createMemo(() => (document.version(), openPoints(document.sheet, props.desk.spread.judged())));
  const groups = createMemo(() =>
    KINDS.map(([kind, title]) => ({ title, points: points().filter((point) => point.kind === kind) })).filter(
      (group) => group.points.length > 0,
    ),
  );
  const follow = (cell: string): void => {
    props.onFollow();
    props.desk.jump(cell);
  };
  return (
    <Show when={groups().length > 0} fallback={<p>Nothing is open: the record can be issued.</p>}>
      <For each={groups()}>
        {(group) => (
          <section class="record-open" aria-label={group.title}>
            <h4>
              {group.title} <span class="record-count">{group.points.length}</span>
            </h4>
            <ul>
              <For each={group.points}>
                {(point) => (
                  <li>
                    <Show when={point.cell} fallback={point.text}>
                      {(cell) => (
                        <button type="button" onClick={() => follow(cell())}>
                          <Prose text={point.text} />
                        </button>
                      )}
                    </Show>
                  </li>
                )}
              </For>
            </ul>
          </section>
        )}
      </For>
    </Show>
  );
}
