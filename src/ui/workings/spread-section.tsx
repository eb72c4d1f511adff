// What the workings say of spread: the ends of a value and where they are, how the builds lie, and what moves it most.

import { For, Show, createMemo } from 'solid-js';
import { declaredSentences } from '../../record/index.ts';
import type { CellReading, OfferedReading } from '../../sheet/index.ts';
import { moversOf } from '../../spread/index.ts';
import type { Desk } from '../desk/index.ts';
import { createRested } from '../pace/index.ts';
import { endCorner } from '../spread/index.ts';
import { Name, Prose } from '../typeset/index.ts';
import { checkSentences, moverRows, valueFacts } from './spread-facts.ts';

/** The movers are worked out once the sheet has rested, in ms. */
const PACE = { rest: 400, most: 5000 };

/** The section of a cell, or of one of its values. */
export function SpreadSection(props: {
  readonly desk: Desk;
  readonly cell: CellReading;
  readonly value: OfferedReading | null;
}) {
  const { desk } = props;
  const path = (): string => (props.value ? `${props.cell.name}.${props.value.name}` : props.cell.name);
  const reading = () => props.value ?? props.cell.reading;
  const facts = createMemo(() => {
    const spread = desk.spread.now();
    const shown = reading();
    if (!spread || !shown || typeof shown.type === 'string' || typeof shown.value !== 'number') return null;
    return valueFacts(path(), shown.type, shown.as, shown.value, spread);
  });
  const said = createMemo(() => {
    const judged = desk.spread.judged();
    if (judged && props.cell.kind === 'part') {
      return declaredSentences(judged.spread).filter((sentence) => sentence.includes(props.cell.name));
    }
    return judged && props.cell.kind === 'check' ? checkSentences(props.cell, judged) : [];
  });
  const rested = createRested(desk.spread.now, PACE);
  const movers = createMemo(() => {
    const spread = rested();
    const shown = reading();
    if (!spread || props.cell.isInput) return [];
    const wanted = props.cell.kind === 'check' ? null : path();
    const found =
      wanted === null
        ? spread.model.checks.find(({ name }) => name === props.cell.name)?.reserve
        : spread.model.values.find((each) => each.path === wanted)?.slot;
    const kind = props.cell.kind === 'check' ? props.cell.check?.reserveType : shown?.type;
    if (found === undefined || found === null || !kind || typeof kind === 'string') return [];
    return moverRows(moversOf(spread.model, found, 1), kind, shown?.as ?? null, spread);
  });

  return (
    <>
      <Show when={facts()?.ends.length}>
        <table class="workings-table">
          <thead>
            <tr>
              <th scope="col">over the declared set</th>
              <th scope="col" class="value-number">
                value
              </th>
              <th scope="col">where</th>
            </tr>
          </thead>
          <tbody>
            <For each={facts()!.ends}>
              {(end) => (
                <tr>
                  <th scope="row">{end.which} end</th>
                  <td class="value-number">{end.value}</td>
                  <td class="words">
                    <Prose text={end.where} />{' '}
                    <Show when={end.isPlace && endCorner(path(), end.which, desk.spread.now())}>
                      {(corner) => (
                        <button type="button" class="stand-button" onClick={() => desk.stand(corner())}>
                          stand there
                        </button>
                      )}
                    </Show>
                  </td>
                </tr>
              )}
            </For>
          </tbody>
        </table>
      </Show>
      <For each={[...said(), ...(facts()?.builds ?? [])]}>
        {(sentence) => (
          <p class="workings-note">
            <Prose text={sentence} />
          </p>
        )}
      </For>
      <Show when={movers().length > 0}>
        <table class="workings-table">
          <thead>
            <tr>
              <th scope="col">{props.cell.kind === 'check' ? 'what moves its reserve most' : 'what moves it most'}</th>
              <th scope="col" class="value-number">
                at its low end
              </th>
              <th scope="col" class="value-number">
                at its high end
              </th>
              <th scope="col" class="value-number">
                of the variance
              </th>
            </tr>
          </thead>
          <tbody>
            <For each={movers()}>
              {(row) => (
                <tr>
                  <th scope="row">
                    <button type="button" class="link-button" onClick={() => desk.jump(row.name.split('.')[0]!)}>
                      <Name path={row.name} />
                    </button>
                  </th>
                  <td class="value-number">{row.low}</td>
                  <td class="value-number">{row.high}</td>
                  <td class="value-number">{row.share}</td>
                </tr>
              )}
            </For>
          </tbody>
        </table>
      </Show>
    </>
  );
}
