// A drawing as SVG elements. Where it leads to cells, its symbols are buttons: one stop for Tab, arrows go from
// symbol to symbol, Enter and Space follow.

import { Index, Show, createContext, createSignal, createUniqueId, useContext } from 'solid-js';
import { Dynamic } from 'solid-js/web';
import type {
  ArcsItem,
  CircleItem,
  ClipItem,
  Drawing,
  GroupItem,
  Item,
  LineItem,
  RectItem,
  TextItem,
} from '../../figure/index.ts';
import {
  arcsAttributes,
  boxAttributes,
  circleAttributes,
  lineAttributes,
  pathData,
  placedRuns,
  rectAttributes,
  textAttributes,
} from './svg-attributes.ts';
import { groupKey, linkedGroups, stepTo, symbolLabel } from './symbol-focus.ts';

interface Symbols {
  /** null where symbols lead nowhere. */
  readonly follow: ((cell: string) => void) | null;
  /** Key of the one symbol that Tab reaches. */
  stop(): string | null;
  setStop(key: string): void;
}

const SymbolsContext = createContext<Symbols>({ follow: null, stop: () => null, setStop: () => {} });

type ItemProps<T extends Item> = { readonly item: T; readonly failing: boolean };

/** A drawing at its own size, shrunk by at most a tenth to fit. Without `follow` it is one picture. */
export function DrawingView(props: { readonly drawing: Drawing; readonly follow?: (cell: string) => void }) {
  const [chosen, setChosen] = createSignal<string | null>(null);
  const symbols: Symbols = {
    get follow() {
      return props.follow ?? null;
    },
    stop() {
      const keys = linkedGroups(props.drawing).map(groupKey);
      const present = chosen();
      return present !== null && keys.includes(present) ? present : (keys[0] ?? null);
    },
    setStop: setChosen,
  };
  let svg!: SVGSVGElement;
  const onKeyDown = (event: KeyboardEvent): void => {
    const next = stepTo(event.key, symbols.stop(), linkedGroups(props.drawing));
    if (next === null || !props.follow) return;
    event.preventDefault();
    setChosen(next);
    svg.querySelector<SVGGElement>(`[data-symbol="${next}"]`)?.focus();
  };
  return (
    <svg
      ref={(element) => (svg = element)}
      class="drawing"
      viewBox={`0 0 ${props.drawing.width} ${props.drawing.height}`}
      width={props.drawing.width}
      height={props.drawing.height}
      role={props.follow ? 'group' : 'presentation'}
      aria-label={props.follow ? props.drawing.title : undefined}
      onKeyDown={onKeyDown}
    >
      <SymbolsContext.Provider value={symbols}>
        <Items items={props.drawing.items} failing={false} />
      </SymbolsContext.Provider>
    </svg>
  );
}

function Items(props: { readonly items: readonly Item[]; readonly failing: boolean }) {
  return (
    <Index each={props.items}>
      {(item) => <Dynamic component={VIEWS[item().kind]} item={item() as never} failing={props.failing} />}
    </Index>
  );
}

function LineView(props: ItemProps<LineItem>) {
  return <path {...lineAttributes(props.item, props.failing)} />;
}

function RectView(props: ItemProps<RectItem>) {
  return <rect {...rectAttributes(props.item, props.failing)} />;
}

function CircleView(props: ItemProps<CircleItem>) {
  return <circle {...circleAttributes(props.item, props.failing)} />;
}

function ArcsView(props: ItemProps<ArcsItem>) {
  return <path {...arcsAttributes(props.item, props.failing)} />;
}

function TextView(props: ItemProps<TextItem>) {
  return (
    <>
      <text {...textAttributes(props.item, props.failing)}>
        <Index each={placedRuns(props.item)}>{(run) => <tspan {...run().attributes}>{run().text}</tspan>}</Index>
      </text>
      {/* Keeps the words of a symbol apart for those who read them as text. */}{' '}
    </>
  );
}

function GroupView(props: ItemProps<GroupItem>) {
  const symbols = useContext(SymbolsContext);
  const cell = (): string | null => (symbols.follow ? props.item.cell : null);
  const follow = (): void => {
    const name = cell();
    if (name !== null) symbols.follow?.(name);
  };
  const onKeyDown = (event: KeyboardEvent): void => {
    if (event.key !== 'Enter' && event.key !== ' ') return;
    event.preventDefault();
    follow();
  };
  return (
    <Show
      when={cell() !== null}
      fallback={
        <g>
          <Items items={props.item.items} failing={props.item.fails} />
        </g>
      }
    >
      <g
        class="symbol-button"
        role="button"
        tabindex={symbols.stop() === groupKey(props.item) ? 0 : -1}
        data-symbol={groupKey(props.item)}
        aria-label={symbolLabel(props.item)}
        onClick={follow}
        onKeyDown={onKeyDown}
        onFocus={() => symbols.setStop(groupKey(props.item))}
      >
        <rect class="symbol-target" {...boxAttributes(props.item.box)} />
        <Items items={props.item.items} failing={props.item.fails} />
      </g>
    </Show>
  );
}

function ClipView(props: ItemProps<ClipItem>) {
  const id = createUniqueId();
  return (
    <>
      <clipPath id={`clip-${id}`}>
        <path d={`${pathData(props.item.outline)}Z`} />
      </clipPath>
      <g clip-path={`url(#clip-${id})`}>
        <Items items={props.item.items} failing={props.failing} />
      </g>
    </>
  );
}

const VIEWS = {
  line: LineView,
  rect: RectView,
  circle: CircleView,
  arcs: ArcsView,
  text: TextView,
  group: GroupView,
  clip: ClipView,
} as const;
