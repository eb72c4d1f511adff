// What is said about links that cannot be made or opened.

import { countText } from './sentences.ts';
import type { StorageFault } from './sentences.ts';

const UNOPENED = 'Nothing was opened.';

/** The faults of links; counts are characters of the fragment, or bytes of the text. */
export const linkFault = {
  /** `total` is null where the link ends before it says how long it is. */
  cut: (arrived: number, total: number | null): StorageFault => ({
    code: 'link-cut',
    text:
      `This link ends in the middle: ${countText(arrived)} of ` +
      `${total === null ? 'an unknown number of' : `about ${countText(total)}`} characters arrived, ` +
      `as happens in some mail programs. ${UNOPENED} Ask for the file instead.`,
  }),
  damaged: (): StorageFault => ({
    code: 'link-damaged',
    text: `This link was altered on its way: its text does not fit its digest. ${UNOPENED} Ask for the link again, or for the file.`,
  }),
  newer: (): StorageFault => ({
    code: 'link-newer',
    text: `This link was made by a newer version of this program. ${UNOPENED} Load this page again, or ask for the file.`,
  }),
  tooLarge: (limit: number): StorageFault => ({
    code: 'link-too-large',
    text: `This link unpacks to more than ${countText(limit)} bytes, the most a sheet may have. ${UNOPENED}`,
  }),
  foreign: (): StorageFault => ({
    code: 'link-foreign',
    text: `What stands behind # in this address is not a sheet of this program. ${UNOPENED}`,
  }),
  cannotUnpack: (): StorageFault => ({
    code: 'link-unsupported',
    text: `This browser cannot unpack links. ${UNOPENED} Ask for the file instead.`,
  }),
  cannotPack: (): StorageFault => ({
    code: 'link-unsupported',
    text: 'This browser cannot pack a sheet into a link. Save it as a file and send that instead.',
  }),
  tooLong: (length: number, limit: number): StorageFault => ({
    code: 'link-too-long',
    text:
      `As a link this sheet has ${countText(length)} characters, more than the ${countText(limit)} ` +
      'that can be passed on safely. Save it as a file and send that instead.',
  }),
  tooLargeToWrite: (bytes: number, limit: number): StorageFault => ({
    code: 'link-too-large',
    text:
      `This sheet has ${countText(bytes)} bytes, more than the ${countText(limit)} that a link may hold. ` +
      'Save it as a file and send that instead.',
  }),
};
