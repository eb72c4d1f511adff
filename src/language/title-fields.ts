// The fields of the title, which are free text.

/** Fields that stand once. */
const SINGLE = 'project number author checker revision reason status date paper samples seed yield'.split(' ');

/** The field that names checked results and may be repeated. */
export const CHECKED = 'checked';

/** All labels that the title knows. */
export const TITLE_FIELDS: readonly string[] = [...SINGLE, CHECKED];
