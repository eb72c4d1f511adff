// The title block, to be filled in: each field is a line under the title of the sheet.

import { For } from 'solid-js';
import { TITLE_LABELS } from '../../record/index.ts';
import type { TitleField } from '../../record/index.ts';
import type { Desk } from '../desk/index.ts';
import { fieldText, setField, setTitle } from './title-edits.ts';

const FIELDS = Object.keys(TITLE_LABELS) as TitleField[];

/** Inputs for the title and its fields; each is kept when it is left, or with Enter. */
export function TitleForm(props: { readonly desk: Desk }) {
  const tree = () => props.desk.document.tree();
  const title = (): string => tree().title?.text ?? '';
  const put = (label: TitleField | 'paper', words: string, text: string): void => {
    if (text.trim() !== fieldText(tree(), label)) props.desk.document.edit(setField(tree(), label, text), words);
  };
  return (
    <form class="record-form" aria-label="Title block" onSubmit={(event) => event.preventDefault()}>
      <label>
        <span>Title</span>
        <input
          type="text"
          value={title()}
          onChange={(event) => {
            const text = event.currentTarget.value;
            if (text.trim() !== title()) props.desk.document.edit(setTitle(tree(), text), 'title');
          }}
        />
      </label>
      <For each={FIELDS}>
        {(label) => (
          <label>
            <span>{TITLE_LABELS[label]}</span>
            <input
              type="text"
              value={fieldText(tree(), label)}
              placeholder="filled in by hand"
              onChange={(event) => put(label, TITLE_LABELS[label].toLowerCase(), event.currentTarget.value)}
            />
          </label>
        )}
      </For>
      <label>
        <span>Paper</span>
        <select onChange={(event) => put('paper', 'paper', event.currentTarget.value)}>
          <option value="A4" selected={fieldText(tree(), 'paper').toLowerCase() !== 'letter'}>
            A4
          </option>
          <option value="Letter" selected={fieldText(tree(), 'paper').toLowerCase() === 'letter'}>
            Letter
          </option>
        </select>
      </label>
    </form>
  );
}
