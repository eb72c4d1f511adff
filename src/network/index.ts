// Stages and points between their resolved legs and their numbers.
//
// Conventions: SI floats; voltages and currents of the circuit in its true frame, device fields in the
// n-channel frame (a p-channel FET is mirrored inside the kernels, by multiplication with its channel, +1 or
// -1); I_D, V_ov, V_DSsat and margin in the device's own sense; temperatures in kelvin.

export type { Emitter, Handle } from './emitter.ts';
export type { Kernel } from './kernel.ts';
export { KERNELS } from './kernels.ts';
export { DEVICE_FIELDS } from './device-field.ts';
export type { DeviceField, DeviceHandles } from './device-field.ts';
export type { NetElement, NetFet, NetLeg, PlaceRef, StageNet } from './stage-net.ts';
export { lowerStage } from './lower-stage.ts';
export { lowerPoint } from './lower-specimen.ts';
export type { SpecimenLowering } from './lower-specimen.ts';
export type { StageLowering } from './stage-lowering.ts';
export { OFFERED_VALUES, REGIONS, offeredValue } from './offered-values.ts';
export type { OfferedUnit, OfferedValue } from './offered-values.ts';
export { POINT_STATUS, POINT_STATUS_SENTENCES, SWING_LIMIT } from './point-status.ts';
export type { DerivationStep } from './derivation.ts';
export { derivePoint } from './derive-law.ts';
export type { SolvedFet } from './derive-law.ts';
export { deriveStage } from './derive-stage.ts';
export type { BandPoints, BiasAllowance } from './bias-band.ts';
export { biasLine, dividerAllowance, gateWindow, middleResistor, selfBiasWindow } from './bias-band.ts';
