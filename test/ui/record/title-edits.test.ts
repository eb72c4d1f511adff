import { describe, expect, it } from 'vitest';
import { applySplices, parseSheet } from '../../../src/language/index.ts';
import { fieldText, setField, setTitle } from '../../../src/ui/record/title-edits.ts';

const put = (text: string, label: string, words: string): string =>
  applySplices(text, setField(parseSheet(text), label, words));
const retitle = (text: string, words: string): string => applySplices(text, setTitle(parseSheet(text), words));

describe('a field of the title', () => {
  const text = '# Probe\n  project: Ice\n  author: -\n  date: today  ; note\n\nx = 1 V\n';

  it('is edited where it stands, nothing else is touched', () => {
    expect(put(text, 'author', 'N. N.')).toBe(text.replace('author: -', 'author: N. N.'));
    expect(put(text, 'date', '2 March')).toBe(text.replace('date: today', 'date: 2 March'));
  });

  it('gets a line in the order of the title block where it is missing', () => {
    expect(put(text, 'number', 'BP-3')).toBe(text.replace('  author', '  number: BP-3\n  author'));
    expect(put(text, 'revision', 'B')).toBe(text.replace('  date', '  revision: B\n  date'));
    expect(put(text, 'paper', 'Letter')).toBe(text.replace('; note\n', '; note\n  paper: Letter\n'));
    expect(put('# Probe\nx = 1 V\n', 'project', 'Ice')).toBe('# Probe\n  project: Ice\nx = 1 V\n');
  });

  it('loses its line when it is emptied', () => {
    expect(put(text, 'author', '  ')).toBe(text.replace('  author: -\n', ''));
    expect(put(text, 'number', '')).toBe(text);
  });

  it('gives the sheet a title where it has none', () => {
    expect(put('x = 1 V\n', 'project', 'Ice')).toBe('# Sheet without a title\n  project: Ice\nx = 1 V\n');
  });

  it('stays in one line, and keeps the line ends of the sheet', () => {
    expect(put('# A\r\nx = 1 V\r\n', 'project', 'two\nlines')).toBe('# A\r\n  project: two lines\r\nx = 1 V\r\n');
  });

  it('is read back as it was given', () => {
    for (const label of ['project', 'number', 'author', 'checker', 'revision', 'reason', 'status', 'date', 'paper']) {
      expect(fieldText(parseSheet(put(text, label, 'a <b> "c"')), label)).toBe('a <b> "c"');
    }
  });
});

describe('the title', () => {
  it('is edited, or put before the first line', () => {
    expect(retitle('# Probe\nx = 1 V\n', 'Other')).toBe('# Other\nx = 1 V\n');
    expect(retitle('x = 1 V\n', 'Other')).toBe('# Other\nx = 1 V\n');
    expect(retitle('x = 1 V\n', '')).toBe('x = 1 V\n');
  });
});
