// The verdict on the whole sheet, always in view; a click or Enter leads to what it speaks of.

import { Show, createMemo } from 'solid-js';
import { verdictOf } from '../../record/index.ts';
import type { Desk } from '../desk/index.ts';
import { Prose } from '../typeset/index.ts';
import { createAnnouncement } from './announcement.ts';
import { VerdictMark } from './verdict-mark.tsx';
import { verdictTarget } from './verdict-target.ts';
import type { Target } from './verdict-target.ts';
import './verdict.css';

/** The verdict line. */
export function VerdictLine(props: { readonly desk: Desk }) {
  const { document } = props.desk;
  const verdict = createMemo(() => (document.version(), verdictOf(document.sheet, props.desk.spread.judged())));
  const target = createMemo(() => verdictTarget(verdict(), document.cells()));
  const sentence = createMemo(() => verdict().sentence);
  const said = createAnnouncement(sentence, document.text);
  const go = (to: Target): void => ('cell' in to ? props.desk.jump(to.cell) : props.desk.jumpToLine(to.line));
  const targetName = (to: Target): string => ('cell' in to ? to.cell : `line ${to.line + 1}`);
  const words = () => (
    <>
      <VerdictMark state={verdict().state} />
      <span class="verdict-sentence">
        <Prose text={sentence()} />
      </span>
    </>
  );

  return (
    <div class="verdict" data-state={verdict().state} role="group" aria-label="Verdict">
      <Show when={target()} fallback={<p class="verdict-words">{words()}</p>}>
        {(to) => (
          <button
            type="button"
            class="verdict-words"
            aria-label={`${sentence()} Go to ${targetName(to())}.`}
            onClick={() => go(to())}
          >
            {words()}
          </button>
        )}
      </Show>
      <div class="unseen" role="status" aria-live="polite">
        {said()}
      </div>
    </div>
  );
}
