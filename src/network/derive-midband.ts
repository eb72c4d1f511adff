// Workings of gain, input and output resistance at midband.

import type { Derivation } from './derivation.ts';
import type { SolvedFet } from './derive-law.ts';
import type { Emitter, Handle } from './emitter.ts';
import { gainOf, inputResistance, midbandNetworks, outputResistance } from './midband.ts';
import type { MidbandNetwork, PortVoltages, Slopes } from './midband.ts';
import type { StageLowering } from './stage-lowering.ts';
import type { StageNet } from './stage-net.ts';
import { term } from './term.ts';
import type { Term } from './term.ts';

/** Writes A_v, R_in and R_out of a stage whose legs are formulas; compound parts get names of their own first. */
export function deriveMidband(d: Derivation, e: Emitter, net: StageNet, fet: SolvedFet, lowering: StageLowering): void {
  const { loaded, unloaded } = midbandNetworks(e, net);
  if (typeof loaded === 'string' || typeof unloaded === 'string') return;
  const slope = (name: string): Term => (fet.offered(name) === 0 ? null : term(d.e.leaf(name, fet.offered(name), 'S')));
  const slopes: Slopes = {
    g_m: slope('g_m'),
    g_ds: slope('g_ds'),
    g_mb: fet.device.gamma === null ? null : slope('g_mb'),
  };
  const has = (name: string): boolean => lowering.values.has(name) && Number.isFinite(fet.offered(name));
  const namer = createNamer(d);
  if (has('A_v')) {
    const named: MidbandNetwork = {
      ...loaded,
      perSignal: namer(loaded.perSignal, 'a', '1', 'per volt of the test source'),
      perCurrent: namer(loaded.perCurrent, 'R', 'ohm', AGAINST_CURRENT),
    };
    d.conclude('A_v', '1', gainOf(e, named, slopes), fet.offered('A_v'), 'Gain from the test source to the output.');
  }
  if (has('R_in')) {
    const formula = inputResistance(e, loaded, slopes, net.driven);
    d.conclude('R_in', 'ohm', formula, fet.offered('R_in'), 'What the test source sees.');
  }
  if (has('R_out')) {
    const named: MidbandNetwork = {
      ...unloaded,
      perPush: namer(unloaded.perPush, 'Z', 'ohm', 'per ampere pushed into the output'),
      perCurrent: namer(unloaded.perCurrent, 'R', 'ohm', AGAINST_CURRENT),
    };
    const formula = outputResistance(e, named, slopes);
    d.conclude(
      'R_out',
      'ohm',
      formula,
      fet.offered('R_out'),
      'What is seen at the output, without what hangs at load.',
    );
  }
}

const AGAINST_CURRENT = 'per ampere of channel current';

/** Gives compound parts of a network names of their own (R_ds, a_gs, ..), equal parts the same one. */
function createNamer(d: Derivation): (v: PortVoltages, letter: string, unit: string, of: string) => PortVoltages {
  const known = new Map<Handle, Handle>();
  const taken = new Set<string>();
  return (v, letter, unit, of) => {
    const name = (x: Term, port: string, what: string): Term => {
      if (!x || x.handle === null || d.e.isLeaf(x.handle)) return x;
      let handle = known.get(x.handle);
      if (handle === undefined) {
        let title = `${letter}_${port}`;
        while (taken.has(title)) title += '0';
        taken.add(title);
        handle = d.state(title, unit, x.handle, `${what}, ${of}.`);
        known.set(x.handle, handle);
      }
      return { handle, negative: x.negative };
    };
    return {
      ds: name(v.ds, 'ds', 'Drain to source'),
      gs: name(v.gs, 'gs', 'Gate to source'),
      sb: name(v.sb, 'sb', 'Source to bulk'),
      out: name(v.out, 'ac', 'At the output'),
    };
  };
}
