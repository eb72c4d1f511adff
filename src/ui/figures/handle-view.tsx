// A point of a chart as a slider: it is dragged along its curve, or stepped by arrow keys.

import type { Chart, Size } from '../../figure/index.ts';
import { followPointer } from './follow-pointer.ts';
import { placeOf, valueBeside } from './figure-size.ts';
import type { ChartHandle } from './turn-q.ts';

/** The handle over the picture of its chart; `onText` hears what it says while it moves. */
export function HandleView(props: {
  readonly handle: ChartHandle;
  readonly chart: Chart;
  readonly size: Size;
  readonly onText: (text: string | null) => void;
}) {
  const place = () => placeOf(props.chart, props.size, props.handle.at);

  const onPointerDown = (event: PointerEvent): void => {
    if (event.button !== 0) return;
    // Axes may change under a drag: it keeps to those it began with.
    const { chart, size, handle } = props;
    const { x } = handle.at;
    followPointer(event, {
      move(pixels) {
        handle.move(valueBeside(chart, size, x, pixels));
        props.onText(props.handle.text);
      },
      end(keep) {
        handle.end(keep);
        props.onText(null);
      },
    });
  };
  const onKeyDown = (event: KeyboardEvent): void => {
    const way = WAYS[event.key];
    if (way === undefined || event.altKey || event.ctrlKey || event.metaKey) return;
    event.preventDefault();
    props.handle.step(way);
    props.onText(props.handle.text);
  };

  return (
    <div
      class="chart-handle"
      role="slider"
      tabindex="0"
      aria-label={props.handle.label}
      aria-valuenow={props.handle.now}
      aria-valuetext={props.handle.text}
      aria-disabled={props.handle.reason !== null}
      title={props.handle.reason ?? undefined}
      style={{ left: `${place().left}px`, top: `${place().top}px` }}
      onPointerDown={onPointerDown}
      onKeyDown={onKeyDown}
      onFocus={() => props.handle.enter()}
      onBlur={() => props.onText(null)}
    />
  );
}

const WAYS: Readonly<Record<string, 'more' | 'less' | undefined>> = {
  ArrowUp: 'more',
  ArrowRight: 'more',
  ArrowDown: 'less',
  ArrowLeft: 'less',
};
