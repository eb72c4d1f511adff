// The field-effect transistor as a square-law device: channel current and derivatives, temperature,
// charge, and the conventions in which the trade writes its constants.
//
// SI throughout, temperatures in K, angles nowhere. Voltages are in the n-channel frame (a p-channel
// device with every voltage negated) unless a function takes the channel as an argument.

export { bodyTransconductance, threshold, thresholdSlope } from './body-effect.ts';
export { JUNCTION_LAW, junctionCapacitance, junctionRatio } from './capacitance.ts';
export {
  channelCurrent,
  channelRegion,
  CUTOFF,
  OHMIC,
  outputConductance,
  SATURATION,
  saturationMargin,
  transconductance,
} from './channel.ts';
export { BOLTZMANN, ELEMENTARY_CHARGE, thermalVoltage } from './constants.ts';
export { DEFAULTS } from './defaults.ts';
export type { DefaultField } from './defaults.ts';
export { DEVICE_POINT, devicePoint } from './device-point.ts';
export type { ChannelConstants } from './device-point.ts';
export type { NamedKernel } from './kernel.ts';
export type { ChannelSign, Family } from './kinds.ts';
export { FORMS } from './forms.ts';
export { LAMBDA_ROUTES } from './lambda-routes.ts';
export { ROUTE_STATUS } from './route-status.ts';
export { ROUTES } from './routes.ts';
export type { Route } from './routes.ts';
export { signReason, wantedSign } from './signs.ts';
export { betaAt, leakageAt, thresholdAt, zeroDriftDrive } from './temperature.ts';
