// Workings of stages and points: the steps of the network's own derivation, with the kinds of the sheet.

import { deriveStage, derivePoint } from '../network/index.ts';
import type { DerivationStep, SolvedFet, SpecimenLowering, StageNet } from '../network/index.ts';
import { PLAIN, knownUnit } from '../quantity/index.ts';
import type { ValueKind } from '../quantity/index.ts';
import type { Read } from './draft.ts';
import type { PartInterface } from './interface.ts';
import type { WorkingStep } from './model.ts';
import type { StageInHand } from './stage-in-hand.ts';

/** The workings of a stage, from its legs to its gain. */
export function stageWorkings({
  net,
  lowering,
  read,
}: Pick<StageInHand, 'lowering' | 'read'> & { readonly net: StageNet }): WorkingStep[] {
  return deriveStage(net, lowering, read).map(asWorkingStep);
}

/** The workings of a point: the law at its temperature and what follows from it. */
export function pointWorkings(point: {
  readonly part: PartInterface;
  readonly lowering: SpecimenLowering;
  readonly ambient: number;
  readonly read: Read;
}): WorkingStep[] {
  const { part, lowering, ambient, read } = point;
  const solved: SolvedFet = {
    channel: part.channel,
    device: part.device,
    read,
    offered: (name) => {
      const handle = lowering.values.get(name);
      return handle === undefined ? NaN : read(handle);
    },
    ambient,
  };
  return derivePoint(solved).map(asWorkingStep);
}

function asWorkingStep(step: DerivationStep): WorkingStep {
  return {
    name: step.name,
    formula: step.formula,
    operands: step.operands.map(({ name, value, unit }) => ({ name, value, type: kindOf(unit), as: null })),
    value: step.value,
    type: kindOf(step.unit),
    as: null,
    sentence: step.sentence,
  };
}

function kindOf(unit: string): ValueKind {
  return unit === '1' ? PLAIN : knownUnit(unit).kind;
}
