// Words behind //, which other languages take for a remark and this one for resistors side by side.

import { message } from './messages.ts';
import type { Message, Span } from './syntax.ts';

/** The fault of an entry, or, where it lies in words behind //, the message that says where remarks stand. */
export function orRemark(fault: Message, text: string, span: Span): Message {
  const mark = /(?:^|\s)\/\/\s*(?=[\p{L}-])/u.exec(text.slice(span.start, span.end));
  if (!mark) return fault;
  const start = span.start + text.slice(span.start, span.end).indexOf('//', mark.index);
  const words = text.slice(start + 2, span.end).trim();
  if (fault.span.start < start || !/\s/.test(words)) return fault;
  return message('remark-mark', { start, end: start + 2 }, '//', words);
}
