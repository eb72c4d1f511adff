// What a bench offers to formulas: the constants it found, with their standard errors, and each specimen's own by name.

import type { Builder } from '../../program/index.ts';
import { CURRENT, PLAIN, RECIPROCAL_VOLTAGE, RESISTANCE, SQUARE_LAW_CONSTANT, VOLTAGE } from '../../quantity/index.ts';
import type { ValueKind } from '../../quantity/index.ts';
import type { OfferDraft } from '../draft.ts';
import type { BenchReading, SpecimenReading } from './bench-reading.ts';
import type { Measured } from './measured.ts';

/** Kind and sentence of every constant. */
const CONSTANTS = {
  beta: [SQUARE_LAW_CONSTANT, 'Square-law constant: I_D = beta V_ov² (1 + lambda V_DS).'],
  V_TO: [VOLTAGE, 'Threshold of the square law, as a voltmeter shows it.'],
  I_DSS: [CURRENT, 'Drain current of the law at V_GS = 0, at the edge of saturation without lambda.'],
  lambda: [RECIPROCAL_VOLTAGE, 'Channel-length modulation.'],
} as const;
type Constant = keyof typeof CONSTANTS;

/** All values of a bench, the whole's before those of its specimens. */
export function benchOffers(reading: BenchReading, measured: Measured, builder: Builder): OfferDraft[] {
  const offer = (name: string, type: ValueKind, value: number | null, sentence: string, missing = ''): OfferDraft => ({
    name,
    type,
    handle: value === null ? null : builder.constant(value),
    sentence,
    missing: value === null ? { code: 'not-fitted', text: missing, span: { start: 0, end: 0 } } : null,
  });
  const constants = Object.keys(CONSTANTS) as Constant[];
  const isOne = measured.specimens === 1;
  const several = isOne ? '' : ' The median of the specimens that are kept.';
  const [only] = reading.specimens;
  return [
    ...constants.map((name) => offer(name, CONSTANTS[name][0], measured[name].nominal, CONSTANTS[name][1] + several)),
    ...(isOne ? errorOffers('', only!, offer) : constants.flatMap((name) => ends(name, measured[name]))),
    ...(isOne ? qualityOffers('', only!, offer) : []),
    ...(isOne && only!.name === '' ? fittedOffers('', only!) : []),
    ...(measured.tracking === null
      ? []
      : [
          offer(
            'tracking',
            PLAIN,
            measured.tracking,
            'How far |V_TO| and I_DSS (V_TO and beta where it is closed at 0 V) go together, -1 to 1.',
          ),
        ]),
    offer('specimens', PLAIN, measured.specimens, 'Number of specimens.'),
    offer('share', PLAIN, measured.kept / measured.specimens, 'Share of the specimens that is kept.'),
    ...(isOne && only!.name === '' ? [] : reading.specimens.flatMap((specimen) => specimenOffers(specimen))),
    ...reading.unfitted.flatMap(({ name, text }) =>
      constants.map((constant) =>
        offer(`${name}.${constant}`, CONSTANTS[constant][0], null, CONSTANTS[constant][1], text),
      ),
    ),
  ];

  function ends(name: Constant, { low, high }: Measured['beta']): OfferDraft[] {
    if (low === null || high === null) return [];
    const [kind, sentence] = CONSTANTS[name];
    return [
      offer(`${name}_min`, kind, low, `${sentence} The least.`),
      offer(`${name}_max`, kind, high, `${sentence} The largest.`),
    ];
  }

  function specimenOffers(specimen: SpecimenReading): OfferDraft[] {
    const prefix = `${specimen.name}.`;
    return [
      ...constants.map((name) => offer(prefix + name, CONSTANTS[name][0], specimen[name], CONSTANTS[name][1])),
      ...errorOffers(prefix, specimen, offer),
      ...qualityOffers(prefix, specimen, offer),
      ...fittedOffers(prefix, specimen),
    ];
  }

  function fittedOffers(prefix: string, { name }: SpecimenReading): OfferDraft[] {
    if (!reading.fitting) return [];
    const fitted = reading.fitting.specimens.find((each) => each.name === name);
    const subject = name === '' ? 'the specimen' : name;
    const rejected = `The lines keep leave ${subject} out.`;
    const beyond = `No resistor sets ${subject} to that current: its V_GS there needs another gate voltage.`;
    return [
      offer(`${prefix}V_GS`, VOLTAGE, fitted?.V_GS ?? null, 'V_GS at the current to fit for.', rejected),
      offer(
        `${prefix}R_S`,
        RESISTANCE,
        fitted?.R_S ?? null,
        'Resistor in the source lead that sets that current.',
        fitted ? beyond : rejected,
      ),
    ];
  }
}

type MakeOffer = (
  name: string,
  type: ValueKind,
  value: number | null,
  sentence: string,
  missing?: string,
) => OfferDraft;

function errorOffers(prefix: string, { errors }: SpecimenReading, offer: MakeOffer): OfferDraft[] {
  return (Object.keys(CONSTANTS) as Constant[]).flatMap((name) => {
    const error = errors[name];
    return error === null ? [] : [offer(`${prefix}s_${name}`, CONSTANTS[name][0], error, `Standard error of ${name}.`)];
  });
}

function qualityOffers(prefix: string, { exponent, errors, rms }: SpecimenReading, offer: MakeOffer): OfferDraft[] {
  return [
    offer(
      `${prefix}exponent`,
      PLAIN,
      exponent,
      'Exponent of V_ov: 2 in the square law, or what fits best where it is free.',
    ),
    ...(errors.exponent === null
      ? []
      : [offer(`${prefix}s_exponent`, PLAIN, errors.exponent, 'Standard error of the exponent.')]),
    offer(`${prefix}rms`, CURRENT, rms, 'Root mean square of what the readings and the square law differ by.'),
  ];
}
