// One step of the workings: what it is, then its formula, the numbers in place and the result, aligned at the sign.

import { Index, Show } from 'solid-js';
import type { PrintedStep } from '../../record/index.ts';
import { Formula, Prose } from '../typeset/index.ts';
import { equationOf } from './equation.ts';
import type { Side } from './equation.ts';
import { createScrollStop } from './scroll-stop.ts';

/** A step; names that belong to `subject` stand without it. */
export function StepLine(props: { readonly step: PrintedStep; readonly subject: string }) {
  const equation = () => equationOf(props.step);
  return (
    <li class="step">
      <Show when={props.step.sentence !== ''}>
        <p class="step-sentence">
          <Prose text={props.step.sentence} subject={props.subject} />
        </p>
      </Show>
      <div class="equation" classList={{ 'equation-bare': equation().left === null }}>
        <Show when={equation().left}>
          {(left) => (
            <span class="equation-left">
              <Formula tex={left().tex} text={left().text} />
            </span>
          )}
        </Show>
        <div class="equation-sides" classList={{ 'equation-condition': equation().verdict !== null }}>
          <Index each={equation().sides}>
            {(side, at) => (
              <SideView side={side()} sign={equation().verdict === null && (at > 0 || equation().left !== null)} />
            )}
          </Index>
          <Show when={equation().verdict}>
            {(verdict) => (
              <span class="equation-verdict" classList={{ fails: verdict() !== 'holds' }}>
                {verdict()}
              </span>
            )}
          </Show>
        </div>
      </div>
    </li>
  );
}

function SideView(props: { readonly side: Side; readonly sign: boolean }) {
  let place!: HTMLDivElement;
  createScrollStop(() => place);
  return (
    <div class="equation-side" ref={(element) => (place = element)} role="group" aria-label={props.side.text}>
      <span class="equation-content">
        <Show when={props.sign}>
          <span class="equation-sign">=</span>
        </Show>
        <Formula tex={props.side.tex} text={props.side.text} />
      </span>
    </div>
  );
}
