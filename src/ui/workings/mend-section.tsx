// What would hold a failing check: one input after the other is turned, and what it would have to be can be put in.

import { For, Show, createEffect, createMemo, createSignal, on, onCleanup } from 'solid-js';
import { failsCheck } from '../../record/index.ts';
import type { CellReading } from '../../sheet/index.ts';
import { tunersOf } from '../../spread/index.ts';
import type { MendAnswer, MendQuestion } from '../../spread/index.ts';
import type { Desk } from '../desk/index.ts';
import { createRested } from '../pace/index.ts';
import { setTurned, turnedNumber } from '../rows/index.ts';
import { startWorker } from '../spread/index.ts';
import { Name, Prose } from '../typeset/index.ts';
import { buyable, mendRow } from './mend-rows.ts';
import type { MendRow } from './mend-rows.ts';

/** Inputs are turned once the sheet has rested, in ms. */
const PACE = { rest: 700, most: 60_000 };

/** The section of a check; nothing while it holds. */
export function MendSection(props: { readonly desk: Desk; readonly cell: CellReading }) {
  const { desk } = props;
  const [rows, setRows] = createSignal<readonly MendRow[]>([]);
  const [isBusy, setBusy] = createSignal(false);
  const judged = createRested(desk.spread.judged, PACE);
  const isFailing = createMemo(() => props.cell.kind === 'check' && failsCheck(props.cell, judged()));
  let worker: ReturnType<typeof startWorker<MendQuestion, MendAnswer>> | null = null;

  const end = (): void => {
    worker?.end();
    worker = null;
    setBusy(false);
  };
  createEffect(
    on([judged, isFailing, () => props.cell.name], ([now, failing]) => {
      end();
      setRows([]);
      if (!now || !failing) return;
      const { spread } = now;
      const inputs = tunersOf(spread.model, props.cell.name).flatMap((name) => {
        const input = spread.model.tunable.find((each) => each.name === name);
        return input ? [{ name, values: buyable(spread.model.slots[input.slot]!, input.type) }] : [];
      });
      if (inputs.length === 0) return;
      setBusy(true);
      worker = startWorker<MendQuestion, MendAnswer>((answer) => {
        setRows((present) => [...present, mendRow(answer, spread, desk.document.sheet)]);
        if (answer.isLast) end();
      });
      worker.ask({ kind: 'mend', id: 1, model: spread.model, inputs });
    }),
  );
  onCleanup(end);

  function putIn({ input, value, valueText }: MendRow): void {
    const cell = desk.document.sheet.cell(input);
    const turned = cell && turnedNumber(desk.document.tree(), cell.tree.line.index, 'entry');
    if (!turned || value === null) return;
    desk.document.edit(setTurned(turned, value), `put ${valueText} into ${input}`);
    desk.say(`${input} is ${valueText}.`, { title: 'Undo', run: () => desk.document.undo() });
  }

  return (
    <Show when={isFailing() && (rows().length > 0 || isBusy())}>
      <h3 class="workings-heading">What would hold it, and all other checks at every extreme</h3>
      <table class="workings-table">
        <thead>
          <tr>
            <th scope="col">input</th>
            <th scope="col">window</th>
            <th scope="col">preferred</th>
            <th scope="col">then tightest</th>
          </tr>
        </thead>
        <tbody>
          <For each={rows()}>
            {(row) => (
              <tr>
                <th scope="row">
                  <Name path={row.input} />
                </th>
                <td class="words">
                  <Prose text={row.window} />
                </td>
                <td class="words">
                  {row.valueText}{' '}
                  <Show when={row.value !== null}>
                    <button type="button" class="link-button" onClick={() => putIn(row)}>
                      put in
                    </button>
                  </Show>
                </td>
                <td class="words">
                  <Prose text={row.next} />
                </td>
              </tr>
            )}
          </For>
        </tbody>
      </table>
      <Show when={isBusy()}>
        <p class="workings-note" role="status">
          Turning the inputs one by one …{' '}
          <button type="button" class="link-button" onClick={end}>
            stop
          </button>
        </p>
      </Show>
    </Show>
  );
}
