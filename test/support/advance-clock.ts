/** Everything but the date stays real: sockets, commits and threads go on as they do. */
const REAL = [
  'clearImmediate',
  'clearInterval',
  'clearTimeout',
  'hrtime',
  'nextTick',
  'performance',
  'queueMicrotask',
  'setImmediate',
  'setInterval',
  'setTimeout',
] as const;

/** Lets a test move the machine's clock: call in `beforeEach`, and `jest.useRealTimers` afterwards. */
export function holdClock(): void {
  jest.useFakeTimers({ doNotFake: [...REAL], now: Date.now() });
}

/** Moves the machine's clock on. */
export function advanceClock(seconds: number): void {
  jest.setSystemTime(Date.now() + seconds * 1000);
}
