// The marks at the left edge of rows, told apart by shape first.

import type { JSX } from 'solid-js';
import { Show } from 'solid-js';
import type { Mark } from '../rows/index.ts';

const SHAPES: Readonly<Record<Mark, () => JSX.Element>> = {
  input: () => <path class="mark-edit-fill" d="M7 2.2 11.8 7 7 11.8 2.2 7Z" />,
  assumed: () => <path class="mark-edit-line mark-dashed" d="M7 1.8 12.2 7 7 12.2 1.8 7Z" />,
  'no-source': () => <path class="mark-edit-line" d="M7 2 12 7 7 12 2 7Z" />,
  computed: () => <path class="mark-soft-line" d="M3 5.2H11M3 8.8H11" />,
  part: () => (
    <>
      <path class="mark-line" d="M1.2 9.8H5.2M8.2 3.6H12.4V1.2M8.2 10.4H12.4V12.8" />
      <path class="mark-line mark-heavy" d="M6.7 2V12" />
    </>
  ),
  stage: () => <path class="mark-line" d="M3.2 2.2 11.8 7 3.2 11.8Z" />,
  inverse: () => <path class="mark-line" d="M5 2 2.4 4.6 5 7.2M2.8 4.6H8.6A2.8 2.8 0 0 1 11.4 7.4V12" />,
  figure: () => <path class="mark-line" d="M2.2 1.6V11.8H12.4M3.6 10.4Q9.4 9.6 11 3" />,
  holds: () => (
    <>
      <circle class="mark-ok-line" cx="7" cy="7" r="5.3" />
      <path class="mark-ok-line" d="M4.6 7.2 6.4 9 9.6 5.2" />
    </>
  ),
  'fails-at-an-end': () => (
    <>
      <circle class="mark-fail-line" cx="7" cy="7" r="5.3" />
      <path class="mark-fail-fill" d="M1.7 7H12.3A5.3 5.3 0 0 1 1.7 7Z" />
    </>
  ),
  fails: () => (
    <>
      <circle class="mark-fail-fill" cx="7" cy="7" r="6" />
      <path class="mark-paper-line" d="M4.7 4.7 9.3 9.3M9.3 4.7 4.7 9.3" />
    </>
  ),
  broken: () => (
    <path
      class="mark-fail-line"
      d="M6.2 2.2H1.8V11.8H5.4L6.6 9.4 4.8 7.2 6.8 4.6ZM8.4 2.2H12.2V11.8H7.6L8.8 9.4 7 7.2 9 4.6Z"
    />
  ),
};

/** A mark with its meaning in words. */
export function MarkShape(props: { readonly mark: Mark | null; readonly text: string }) {
  return (
    <>
      <Show when={props.mark}>
        {(mark) => (
          <svg class="mark" viewBox="0 0 14 14" width="14" height="14" aria-hidden="true">
            {SHAPES[mark()]()}
          </svg>
        )}
      </Show>
      <span class="unseen">{props.text}</span>
    </>
  );
}
