// The two rails that a bias hangs between, and what the sheet's text says of them.

/** Where a stage of one FET hangs; voltages of the construction are in the n-channel frame, against the near rail. */
export interface BiasRails {
  /** 1 for n-channel, -1 for p-channel. */
  readonly channel: 1 | -1;
  /** As written in legs: the rail at which the source resistor ends, and the one that the drain leads to. */
  readonly near: string;
  readonly far: string;
  /** Volts between the two, above 0. */
  readonly height: number;
}

/** The rails of a channel on a supply against 0 V: where the supply's sign is not the channel's, the source stands at the supply. */
export function biasRails(channel: 1 | -1, supply: string, volts: number): BiasRails {
  const height = Math.abs(volts);
  return channel * volts > 0
    ? { channel, near: '0 V', far: supply, height }
    : { channel, near: supply, far: '0 V', height };
}
