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
 * The forms of a law at T_nom. Source: the conventions table of the design; beta = I_DSS / V_P², g_fs0 = 2 I_DSS / |V_P|,
 * K = beta, K_P = 2 beta L / W, R_DS(on) at V_GS = 0 is 1 / (2 beta |V_TO|).
 */
export function lawForms(
  family: 'JFET' | 'MOSFET',
  channel: 1 | -1,
  law: RouteResult,
  lambda: Handle,
  given: GivenFields,
  builder: Builder,
): OfferDraft[] {
  const { beta, V_TO } = law;
  const two = builder.constant(2);
  const mirrored = (x: Handle): Handle => (channel === 1 ? x : builder.neg(x));
  const magnitude = builder.abs(V_TO);
  const saturated = builder.mul(beta, builder.mul(V_TO, V_TO));
  const transconductance = builder.mul(two, builder.mul(beta, magnitude));
  const form = (name: string, type: ValueKind, handle: Handle, sentence: string): OfferDraft => ({
    name,
    type,
    handle,
    sentence,
    missing: null,
  });
  const slope = form('lambda', RECIPROCAL_VOLTAGE, lambda, 'Channel-length modulation.');
  if (family === 'JFET') {
    return [
      form('beta', SQUARE_LAW_CONSTANT, beta, 'Square-law constant: I_D = beta V_ov² (1 + lambda V_DS).'),
      form('V_TO', VOLTAGE, V_TO, 'Pinch-off voltage as a model card writes it: negative on both channels.'),
      form('I_DSS', CURRENT, saturated, 'Drain current at V_GS = 0, at the edge of saturation without lambda.'),
      form('V_P', VOLTAGE, mirrored(V_TO), 'Pinch-off voltage in the sense of the channel.'),
      form('g_fs0', CONDUCTANCE, transconductance, 'Transconductance at V_GS = 0.'),
      form(
        'R_DSon',
        RESISTANCE,
        builder.div(builder.constant(1), transconductance),
        'Channel resistance at V_GS = 0 and small V_DS.',
      ),
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
  ];
}
