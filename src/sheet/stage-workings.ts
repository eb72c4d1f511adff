// Workings of stages and points: the steps of the network, given the names of the sheet.

export const stageWorkings = (_: unknown) => [];
export const pointWorkings = (_: unknown) => [];
