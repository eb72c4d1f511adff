// The fields of a dialog that asks for values: one line of text, or one of several words.

import { For } from 'solid-js';
import { Prose } from '../typeset/index.ts';

/** A labelled entry, written as in the sheet. */
export function EntryField(props: {
  readonly label: string;
  readonly value: string;
  readonly hint?: string;
  /** For a name or a tolerance. */
  readonly short?: boolean;
  readonly onInput: (text: string) => void;
}) {
  return (
    <label classList={{ 'choice-short': props.short }}>
      <span>
        <Prose text={props.label} />
      </span>
      <input
        autocomplete="off"
        spellcheck={false}
        placeholder={props.hint}
        value={props.value}
        onInput={(event) => props.onInput(event.currentTarget.value)}
      />
    </label>
  );
}

/** A labelled choice. */
export function SelectField<Value extends string>(props: {
  readonly label: string;
  readonly value: Value;
  readonly options: readonly { readonly value: Value; readonly words: string }[];
  readonly onChange: (value: Value) => void;
}) {
  return (
    <label>
      <span>
        <Prose text={props.label} />
      </span>
      <select onChange={(event) => props.onChange(event.currentTarget.value as Value)}>
        <For each={props.options}>
          {({ value, words }) => (
            <option value={value} selected={value === props.value}>
              {words}
            </option>
          )}
        </For>
      </select>
    </label>
  );
}
