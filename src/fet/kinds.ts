// The four kinds of FET, and the mirror between them.
//
// All physics of this folder is that of an n-channel device. A p-channel device is the same device with
// every voltage negated, so the channel is a factor +1 or -1 that meets each voltage once, on entry or
// on exit. Negation is exact: a mirrored part gives mirrored numbers to the last bit.

export type Family = 'JFET' | 'MOSFET';

/** +1 for n, -1 for p: the factor between a node difference and the same voltage in the n-channel frame. */
export type ChannelSign = 1 | -1;
