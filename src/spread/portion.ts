// How builds are cut into portions.

/** Builds that are counted in one portion, whoever counts them. */
export const PORTION = 8192;
