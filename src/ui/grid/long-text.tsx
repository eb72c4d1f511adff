// A text that shows its first lines and a control that opens the rest. Only texts that could be too long are measured.

import { Show, createSignal, onCleanup, onMount } from 'solid-js';
import type { JSX } from 'solid-js';
import { hiddenLines } from './hidden-lines.ts';

/** A text of fewer characters never fills the lines there are, however narrow its column. */
const MEASURED_FROM = 40;

interface LongTextProps {
  /** How long the text is, in characters. */
  readonly length: number;
  /** `entry of R_S`, for the name of the control. */
  readonly what: string;
  readonly class: string;
  readonly open: boolean;
  readonly toggle: () => void;
  readonly children: JSX.Element;
}

/** A text cut behind its first lines, by the styles of `class`, unless it is open. */
export function LongText(props: LongTextProps) {
  return (
    <Show
      when={props.length >= MEASURED_FROM}
      fallback={<span class={`long-text ${props.class}`}>{props.children}</span>}
    >
      <Measured {...props} />
    </Show>
  );
}

function Measured(props: LongTextProps) {
  let text!: HTMLSpanElement;
  const [hidden, setHidden] = createSignal(0);
  onMount(() => {
    const observer = new ResizeObserver(() => {
      if (props.open) return;
      setHidden(hiddenLines(text.scrollHeight, text.clientHeight, parseFloat(getComputedStyle(text).lineHeight)));
    });
    observer.observe(text);
    onCleanup(() => observer.disconnect());
  });
  return (
    <>
      <span
        ref={(element) => (text = element)}
        class={`long-text ${props.class}`}
        classList={{ 'long-text-open': props.open }}
      >
        {props.children}
      </span>
      <Show when={hidden() > 0 || props.open}>
        <button
          type="button"
          class="more-text"
          tabIndex={-1}
          aria-expanded={props.open}
          aria-label={props.open ? `fewer lines of ${props.what}` : `${hidden()} more lines of ${props.what}`}
          onDblClick={(event) => event.stopPropagation()}
          onClick={(event) => {
            event.stopPropagation();
            props.toggle();
          }}
        >
          {props.open ? 'less' : `… ${hidden()} more`}
        </button>
      </Show>
    </>
  );
}
