// Following a sheet: a quick look follows every change, the whole count comes once the text rests, and nothing stale is shown.

import { afterEach, beforeEach, expect, test, vi } from 'vitest';
import { createSpreadJob } from '../../src/spread/index.ts';
import type { SpreadAnswer, SpreadQuestion } from '../../src/spread/index.ts';
import type { SheetSpread } from '../../src/spread/index.ts';
import { samplingOf } from '../../src/record/index.ts';
import { createSheet } from '../../src/sheet/index.ts';
import { createFollower } from '../../src/ui/spread/follower.ts';
import type { MakeWorker, Progress } from '../../src/ui/spread/follower.ts';

const TEXT = '# T\n  samples: 20000\nR = 1 kohm ± 10 %\nx = R * 2\na = check x <= 2.1 kohm\n';

/** Workers that answer when they are told to. */
function hands(): { make: MakeWorker; step: () => boolean; asked: SpreadQuestion[]; ended: () => number } {
  const asked: SpreadQuestion[] = [];
  const jobs: { job: Generator<SpreadAnswer>; onAnswer: (answer: SpreadAnswer) => void; isEnded: boolean }[] = [];
  let ended = 0;
  return {
    asked,
    ended: () => ended,
    make(onAnswer) {
      let present: (typeof jobs)[number] | null = null;
      return {
        ask(question) {
          asked.push(question);
          if (present) present.isEnded = true;
          present = { job: createSpreadJob(question), onAnswer, isEnded: false };
          jobs.push(present);
        },
        end() {
          ended++;
          if (present) present.isEnded = true;
        },
      };
    },
    /** Lets every worker give its next answer; false where none has any. */
    step() {
      const busy = jobs.filter(({ isEnded }) => !isEnded);
      for (const each of busy) {
        const { value, done } = each.job.next();
        if (done) each.isEnded = true;
        else each.onAnswer(value);
      }
      return busy.some(({ isEnded }) => !isEnded);
    },
  };
}

/** A follower of texts, with what it said last. */
function following(make: MakeWorker) {
  let known: SheetSpread | null = null;
  let progress: Progress | null = null;
  const follower = createFollower(make, {
    onKnown: (spread) => (known = spread),
    onStale: () => undefined,
    onProgress: (now) => (progress = now),
  });
  return {
    follow(text: string) {
      const sheet = createSheet(text);
      follower.follow(sheet.spreadModel(), samplingOf(sheet.tree));
    },
    stop: () => follower.stop(),
    known: (): SheetSpread | null => known,
    progress: (): Progress | null => progress,
  };
}

beforeEach(() => void vi.useFakeTimers());
afterEach(() => void vi.useRealTimers());

test('a quick look comes at once, all builds once the text has rested, and the seed and number are those of the sheet', () => {
  const { make, step, asked } = hands();
  const { follow, known, progress } = following(make);
  follow(TEXT);
  expect(known()).toBeNull();
  step();
  expect(known()!.value('x')).toMatchObject({ low: { value: 1800 }, high: { value: 2200 } });
  expect(known()!.report.builds).toBe(256);
  vi.advanceTimersByTime(1000);
  expect(progress()).toEqual({ builds: 0, of: 20_000 });
  while (step());
  expect(known()!.report.builds).toBe(20_000);
  expect(progress()).toBeNull();
  expect(asked.map(({ effort, samples, seed }) => [effort, samples, seed])).toEqual([
    ['quick', 256, 1],
    ['full', 20_000, 1],
  ]);
});

test('a change while builds are counted ends the count, and no answer to the sheet before is shown', () => {
  const { make, step, ended } = hands();
  const { follow, known } = following(make);
  follow(TEXT);
  step();
  vi.advanceTimersByTime(1000);
  step();
  expect(known()!.report.builds).toBe(512);
  follow(TEXT.replace('1 kohm', '3 kohm'));
  expect(ended()).toBe(1);
  step();
  expect(known()!.value('x')!.high.value).toBe(6600);
  vi.advanceTimersByTime(1000);
  while (step());
  expect(known()!.report.builds).toBe(20_000);
  expect(known()!.value('x')!.high.value).toBe(6600);
});

test('changes while a quick look is under way are looked at together, the latest sheet', () => {
  const { make, step, asked } = hands();
  const { follow, known } = following(make);
  for (const digit of ['1', '2', '3', '4']) follow(TEXT.replace('1 kohm', `${digit} kohm`));
  expect(asked.length).toBe(1);
  step();
  expect(known()).toBeNull();
  expect(asked.length).toBe(2);
  expect(asked[1]!.model.drawn[0]!.spread.nominal).toBe(4000);
});

test('a sheet without spread asks for nothing and shows none', () => {
  const { make, step, asked } = hands();
  const { follow, known } = following(make);
  follow(TEXT);
  step();
  follow('R = 1 kohm');
  vi.advanceTimersByTime(1000);
  expect([asked.length, known()]).toEqual([1, null]);
});

test('a count that is stopped keeps what was counted', () => {
  const { make, step } = hands();
  const { follow, known, progress, stop } = following(make);
  follow(TEXT);
  step();
  vi.advanceTimersByTime(1000);
  step();
  stop();
  expect(step()).toBe(false);
  expect(progress()).toBeNull();
  expect(known()!.report.builds).toBe(512);
});
