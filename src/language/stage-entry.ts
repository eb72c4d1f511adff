// stage = "stage" "of" ( name | name "=" name { "," name "=" name } ) ;   its fields are in stage-fields.ts.

import { beginsWith } from './entry-kind.ts';
import type { EntryKind } from './entry-kind.ts';
import { halt } from './messages.ts';
import type { Reader } from './reader.ts';
import { readStageField } from './stage-fields.ts';
import type { NameRef, StageEntry } from './syntax.ts';

const ONE = 'stage of Q1';
const SEVERAL = 'stage of Qa = Q1, Qb = Q1';

export const STAGE: EntryKind = {
  type: 'stage',
  starts: beginsWith('stage'),
  read: readStage,
  fields: { read: readStageField, rows: false },
};

function readStage(reader: Reader): StageEntry {
  const { start } = reader.take();
  if (!reader.takeWord('of')) halt('name-missing', reader.ahead, 'The word of', ONE);
  const first = reader.takeName('The name of a part', ONE);
  const fets: { name: NameRef | null; part: NameRef }[] = [];
  if (reader.takeSign('=')) {
    fets.push({ name: first, part: reader.takeName('The name of a part', SEVERAL) });
    while (reader.takeSign(',')) {
      const name = reader.takeName('The name of a further FET', SEVERAL);
      if (!reader.takeSign('=')) halt('name-missing', reader.ahead, 'The part of this FET', SEVERAL);
      fets.push({ name, part: reader.takeName('The name of a part', SEVERAL) });
    }
  } else {
    if (reader.atSign(',')) halt('name-missing', reader.last, 'A name of its own for each FET', SEVERAL);
    fets.push({ name: null, part: first });
  }
  reader.expectNothing();
  return { type: 'stage', fets, span: reader.spanFrom(start) };
}
