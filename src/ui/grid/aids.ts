// What helps where the keyboard is a phone's: neighbours of the number being typed, signs, the verdict meanwhile.

import { applySplices, parseSheet } from '../../language/index.ts';
import { verdictOf } from '../../record/index.ts';
import type { SheetDocument } from '../document/index.ts';
import { editSplices, editText, nextValue, setTurned, turnedNumber } from '../rows/index.ts';
import type { Editor } from './editor.ts';

/** Signs of the sheet that phone keyboards hide. */
export const SIGNS = ['±', '%', '..', 'k', 'M', 'm', 'µ', 'Ω', '^', '_'] as const;

interface Step {
  readonly title: string;
  readonly label: string;
  /** The whole text with the number stepped. */
  readonly text: string;
}

/** One step down and up of the number in the text being edited; null where there is none. */
export function stepsOf(editor: Editor): readonly Step[] | null {
  const editing = editor.editing();
  if (!editing || editing.place.column !== 'entry' || editing.place.isNew) return null;
  const { place } = editing;
  const tree = parseSheet(
    applySplices(editing.tree.text, editSplices(editing.tree, place, editor.text())),
    editing.tree,
  );
  const turned = turnedNumber(tree, place.line, 'entry');
  if (!turned) return null;
  const steps = (['down', 'up'] as const).flatMap((way): Step[] => {
    const value = nextValue(turned, way);
    if (value === null) return [];
    const splices = setTurned(turned, value);
    const after = parseSheet(applySplices(tree.text, splices), tree);
    const number = splices[0]!.text;
    const title = way === 'down' ? `− ${number}` : `${number} +`;
    return [{ title, label: `${number}, one step ${way}`, text: editText(after, place) }];
  });
  return steps.length > 0 ? steps : null;
}

/** A text with a sign put at the caret. */
export function inserted(text: string, caret: number | null, sign: string): { text: string; caret: number } {
  const at = caret ?? text.length;
  return { text: text.slice(0, at) + sign + text.slice(at), caret: at + sign.length };
}

/** What the sheet comes to with the text as it is being typed. */
export function verdictText(document: SheetDocument): string {
  document.version();
  return verdictOf(document.sheet).sentence;
}
