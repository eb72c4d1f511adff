// The steps of a cell in order.

import { Index, Show, createMemo, createSignal } from 'solid-js';
import { printStep } from '../../record/index.ts';
import type { WorkingStep } from '../../sheet/index.ts';
import { StepLine } from './step-line.tsx';

interface StepsProps {
  readonly steps: readonly WorkingStep[];
  readonly subject: string;
}

/** Steps as printed lines; a line whose step says the same as before stays as it is. */
export function StepList(props: StepsProps) {
  const printed = createMemo(() => props.steps.map((step) => printStep(step, props.subject)));
  return (
    <ol class="steps">
      <Index each={printed()}>{(step) => <StepLine step={step()} subject={props.subject} />}</Index>
    </ol>
  );
}

/** The whole workings behind a disclosure; made when it is opened. */
export function AllSteps(props: StepsProps) {
  const [open, setOpen] = createSignal(false);
  return (
    <details class="all-steps" onToggle={(event) => setOpen(event.currentTarget.open)}>
      <summary>all workings of {props.subject}</summary>
      <Show when={open()}>
        <StepList steps={props.steps} subject={props.subject} />
      </Show>
    </details>
  );
}
