import { addMinutes, minutesRun, running, startTimer, stopTimer } from './timers';

const TEN = Date.parse('2026-02-02T10:00:00Z');
const MINUTE = 60_000;

describe('timers', () => {
  it('started, given a phone closed for 42 minutes, has run for 42 and adds them to what is written', () => {
    const started = startTimer({ actual: { stages: { strip: 15 } } }, 'strip', TEN);
    // As it comes back from the device.
    const back = JSON.parse(JSON.stringify(started)) as typeof started;
    expect(minutesRun(back, 'strip', TEN + 42 * MINUTE)).toBe(42);
    const stopped = stopTimer(back, 'strip', TEN + 42 * MINUTE);
    expect(stopped.actual?.stages.strip).toBe(57);
    expect(stopped).not.toHaveProperty('timers');
  });

  it('started twice, given one that runs, keeps its first beginning', () => {
    const started = startTimer({}, 'clean', TEN);
    expect(startTimer(started, 'clean', TEN + 5 * MINUTE)).toBe(started);
  });

  it('several at once, given two stages, run each by itself', () => {
    const both = startTimer(startTimer({}, 'clean', TEN), 'repair', TEN + 10 * MINUTE);
    expect(running(both)).toEqual(['clean', 'repair']);
    const one = stopTimer(both, 'clean', TEN + 20 * MINUTE);
    expect(running(one)).toEqual(['repair']);
    expect(one.actual?.stages).toEqual({ clean: 20 });
  });

  it('stopped, given a clock set back meanwhile, adds nothing', () => {
    const stopped = stopTimer(startTimer({}, 'dry', TEN), 'dry', TEN - 60 * MINUTE);
    expect(stopped.actual?.stages.dry).toBe(0);
  });
});

describe('addMinutes', () => {
  it('taken off, given fewer than that, ends at none', () => {
    const path = '/actual/stages/mask';
    const five = addMinutes({}, path, 5);
    expect(addMinutes(five, path, 15).actual?.stages.mask).toBe(20);
    expect(addMinutes(five, path, -15).actual?.stages.mask).toBe(0);
  });
});
