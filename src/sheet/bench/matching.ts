// Groups of specimens that would show nearly the same V_GS in the user's own stage.

import { matchGroups } from '../../measured/index.ts';
import { stop } from '../stop.ts';
import type { MatchReading } from './bench-reading.ts';
import type { FittedSpecimen } from './fits.ts';
import type { Match } from './settings.ts';

/** Groups those that are kept, the best first; stops where they are too few for one. */
export function matchReading(specimens: readonly FittedSpecimen[], match: Match): MatchReading {
  const { size, I_D, I_second, V_DS, tree } = match;
  const kept = specimens.filter(({ reading }) => reading.isKept);
  const noun = size === 2 ? 'pair' : 'quad';
  if (kept.length < size) {
    const count = kept.length === specimens.length ? 'has' : 'keeps';
    const text = `The bench ${count} ${kept.length} ${kept.length === 1 ? 'specimen' : 'specimens'}, and a ${noun} wants ${size}. Measure more of them, or leave this line out.`;
    stop('bench-match', text, tree.body.span, tree.line);
  }
  const nameOf = (index: number): string => kept[index]!.specimen.name;
  const { groups, single } = matchGroups(
    kept.map(({ fit }) => fit),
    { size, I_D, I_second, V_DS },
  );
  return {
    size,
    I_D,
    I_second,
    V_DS,
    groups: groups.map(({ members, ...rest }) => ({
      ...rest,
      members: members.map(({ index, ...member }) => ({ name: nameOf(index), ...member })),
    })),
    single: single.map(nameOf),
  };
}
