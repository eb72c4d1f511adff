// Help: the keys, from the list of commands, and how a line is written.

import { For } from 'solid-js';
import type { Desk } from '../desk/index.ts';
import { Modal } from './modal.tsx';

const LINES: readonly (readonly [line: string, what: string])[] = [
  ['V_DD = 15 V ± 5 %  [data sheet, p. 2]  ; note', 'an input with its tolerance, source and note'],
  ['T_A = 25 degC in 0 degC .. 60 degC', 'nominal value in limits; T_A is the ambient temperature'],
  ['Q1 = n-JFET', 'a part; its data-sheet rows stand indented below it'],
  ['  I_DSS: 2 mA .. 9 mA at V_DS = 15 V', 'limits alone, as printed, with their test condition'],
  ['A1 = stage of Q1', 'a stage; a line for each place and what hangs on it'],
  ['  source: R_S to 0 V, 47 uF to 0 V', 'element to place, separated by commas'],
  ['P1 = point of Q1', 'a FET held at V_GS or I_D and V_DS'],
  ['headroom = check A1.margin >= 1 V', 'a requirement'],
  [
    'R_S0 = R_S such that A1.I_D = 1 mA over 100 ohm .. 10 kohm',
    'what an input would have to be; each at the end: in every build',
  ],
  ['A_off = A1.A_v with V_C = -8 V', 'a value in another state of the same build'],
  ['R_buy = E24(R_S0)', 'the nearest preferred value'],
  ['F1 = plot A1.I_D against R_S over 100 ohm .. 10 kohm log', 'a curve'],
];
/** What Insert offers beside single lines. */
const DIALOGS: readonly (readonly [title: string, what: string])[] = [
  ['band', 'limits of the drain current in; three ways to bias side by side, with what each reaches over everything'],
  ['divider pair', 'two preferred resistors for a voltage at their tap, ranked by what they miss'],
];
/** Keys of the grid that are no commands. */
const GRID_KEYS: readonly (readonly [key: string, what: string])[] = [
  ['arrows, Home, End, Page', 'move by cell'],
  ['Enter, F2', 'edit the cell; on a name: rename it everywhere'],
  ['any character', 'replaces the entry'],
  ['Alt+PageUp, Alt+PageDown', 'turn a value one step'],
  ['Space on a heading', 'fold, unfold'],
  ['F6, Shift+F6', 'next pane, pane before'],
  ['F9, Escape', 'into the workings, and back'],
];

/** Everything one has to know to begin. */
export function HelpDialog(props: { readonly desk: Desk; readonly onClose: () => void }) {
  const keyed = () => props.desk.commands().filter(({ keys }) => keys.length > 0);
  return (
    <Modal title="Help" onClose={() => props.onClose()}>
      <section>
        <h3>Lines of a sheet</h3>
        <dl class="help-lines">
          <For each={LINES}>
            {([line, what]) => (
              <div>
                <dt>
                  <code>{line}</code>
                </dt>
                <dd>{what}</dd>
              </div>
            )}
          </For>
        </dl>
      </section>
      <section>
        <h3>Found for you, from Insert</h3>
        <dl class="help-lines">
          <For each={DIALOGS}>
            {([title, what]) => (
              <div>
                <dt>{title}</dt>
                <dd>{what}</dd>
              </div>
            )}
          </For>
        </dl>
      </section>
      <section>
        <h3>Keys</h3>
        <dl class="help-keys">
          <For each={GRID_KEYS}>
            {([key, what]) => (
              <div>
                <dt>
                  <kbd>{key}</kbd>
                </dt>
                <dd>{what}</dd>
              </div>
            )}
          </For>
          <For each={keyed()}>
            {(command) => (
              <div>
                <dt>
                  <kbd>{command.keys.join(', ')}</kbd>
                </dt>
                <dd>{command.title}</dd>
              </div>
            )}
          </For>
        </dl>
      </section>
    </Modal>
  );
}
