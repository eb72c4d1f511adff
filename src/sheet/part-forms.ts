// One square law in every convention of the trade, as values a part offers: the forms it was not given in.

import type { Handle } from '../network/index.ts';
import type { Builder } from '../program/index.ts';
import {
  CONDUCTANCE,
  CURRENT,
  RECIPROCAL_VOLTAGE,
  RESISTANCE,
  SQUARE_LAW_CONSTANT,
  VOLTAGE,
} from '../quantity/index.ts';
import type { ValueKind } from '../quantity/index.ts';
import type { GivenFields, RouteResult } from './part-given.ts';
import type { OfferDraft } from './draft.ts';

/**
 * The forms of a law at T_nom, as the terminals show them. Source: the conventions table of the design; beta = I_DSS / V_P²,
 * g_fs0 = 2 I_DSS / |V_P|, K = beta, K_P = 2 beta L / W, R_DS(on) at V_GS = 0 is 1 / (2 beta |V_TO|); with r_s the channel
 * stands at V_GS = -I r_s, g_m shows as g_m / (1 + g_m r_s), and R_DS(on) holds r_s + r_d.
 */
export function lawForms(
  family: 'JFET' | 'MOSFET',
  channel: 1 | -1,
  law: RouteResult,
  { lambda, r_s, r_d }: { readonly lambda: Handle; readonly r_s: Handle | null; readonly r_d: Handle | null },
  given: GivenFields,
  builder: Builder,
): OfferDraft[] {
  const { beta, V_TO } = law;
  const one = builder.constant(1);
  const two = builder.constant(2);
  const mirrored = (x: Handle): Handle => (channel === 1 ? x : builder.neg(x));
  const magnitude = builder.abs(V_TO);
  const intrinsic = builder.mul(two, builder.mul(beta, magnitude));
  const { current: saturated, gm: transconductance } = r_s
    ? behindLead(beta, magnitude, r_s, builder)
    : { current: builder.mul(beta, builder.mul(V_TO, V_TO)), gm: intrinsic };
  const inLeads = [r_s, r_d].filter((lead) => lead !== null);
  const onResistance = inLeads.reduce((sum, lead) => builder.add(sum, lead), builder.div(one, intrinsic));
  const fitted =
    law.R_0 === null
      ? []
      : [
          form('R_0', RESISTANCE, law.R_0, 'Series resistance that the three R_DSon rows fit.'),
          ...(r_d === null ? [] : [form('r_d', RESISTANCE, r_d, 'Resistance inside the drain lead: R_0 - r_s.')]),
        ];
  const slope = form('lambda', RECIPROCAL_VOLTAGE, lambda, 'Channel-length modulation.');
  if (family === 'JFET') {
    return [
      form('beta', SQUARE_LAW_CONSTANT, beta, 'Square-law constant: I_D = beta V_ov² (1 + lambda V_DS).'),
      form('V_TO', VOLTAGE, V_TO, 'Pinch-off voltage as a model card writes it: negative on both channels.'),
      form('I_DSS', CURRENT, saturated, 'Drain current at V_GS = 0, at the edge of saturation without lambda.'),
      form('V_P', VOLTAGE, mirrored(V_TO), 'Pinch-off voltage in the sense of the channel.'),
      form('g_fs0', CONDUCTANCE, transconductance, 'Transconductance at V_GS = 0.'),
      form('R_DSon', RESISTANCE, onResistance, 'Resistance at V_GS = 0 and small V_DS, r_s and r_d included.'),
      slope,
    ];
  }
  const W = given.get('W')?.[0]?.handle ?? builder.constant(1);
  const L = given.get('L')?.[0]?.handle ?? builder.constant(1);
  return [
    form('K', SQUARE_LAW_CONSTANT, beta, 'Square-law constant: I_D = K V_ov² (1 + lambda V_DS).'),
    form(
      'K_P',
      SQUARE_LAW_CONSTANT,
      builder.div(builder.mul(two, builder.mul(beta, L)), W),
      'Process constant at W / L as given, else 1: I_D = (K_P / 2)(W / L) V_ov².',
    ),
    form(
      'V_TO',
      VOLTAGE,
      mirrored(V_TO),
      'Threshold of the square law: positive for n enhancement, negative for p enhancement.',
    ),
    form(
      'I_DSS',
      CURRENT,
      builder.mul(saturated, builder.op('less', V_TO, builder.constant(0))),
      'Drain current at V_GS = 0, at the edge of saturation without lambda; 0 for an enhancement MOSFET.',
    ),
    slope,
    ...fitted,
  ];
}

function form(name: string, type: ValueKind, handle: Handle, sentence: string): OfferDraft {
  return { name, type, handle, sentence, missing: null };
}

/**
 * I_D and g_fs at V_GS = 0 with r in the source lead: I = beta (u - I r)² with u = |V_TO|, solved without subtraction as
 * 2 beta u² / (1 + t + sqrt(1 + 2 t)), t = 2 beta r u.
 */
function behindLead(beta: Handle, u: Handle, r: Handle, builder: Builder): { current: Handle; gm: Handle } {
  const one = builder.constant(1);
  const two = builder.constant(2);
  const t = builder.mul(two, builder.mul(builder.mul(beta, r), u));
  const root = builder.op('sqrt', builder.add(one, builder.mul(two, t)));
  const current = builder.div(
    builder.mul(two, builder.mul(beta, builder.mul(u, u))),
    builder.add(builder.add(one, t), root),
  );
  const drive = builder.sub(u, builder.mul(current, r));
  const gm = builder.mul(two, builder.mul(beta, drive));
  return { current, gm: builder.div(gm, builder.add(one, builder.mul(gm, r))) };
}
