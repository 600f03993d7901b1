import {
  createEnvironmentInjector,
  EnvironmentInjector,
  runInInjectionContext,
} from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { BroadcastChannel } from 'node:worker_threads';
import { otherWindows, type Windows } from './windows';

interface Opened {
  readonly windows: Windows;
  readonly heard: jest.Mock;
  readonly close: () => void;
}

function openWindow(): Opened {
  const own = createEnvironmentInjector([], TestBed.inject(EnvironmentInjector));
  const heard = jest.fn();
  const windows = runInInjectionContext(own, () => otherWindows(heard));
  return { windows, heard, close: () => own.destroy() };
}

describe('otherWindows', () => {
  beforeAll(() => {
    globalThis.BroadcastChannel ??=
      BroadcastChannel as unknown as typeof globalThis.BroadcastChannel;
  });

  it('tells the others, not itself', async () => {
    const [one, other] = [openWindow(), openWindow()];
    const told = new Promise((resolve) => other.heard.mockImplementation(resolve));
    one.windows.tell();
    await told;
    expect(one.heard).not.toHaveBeenCalled();
    [one, other].forEach(({ close }) => close());
  });

  it('given a window that has gone, says nothing and does not fail', async () => {
    const [gone, other] = [openWindow(), openWindow()];
    gone.close();
    expect(() => gone.windows.tell()).not.toThrow();
    await new Promise((resolve) => setTimeout(resolve, 50));
    expect(other.heard).not.toHaveBeenCalled();
    other.close();
  });
});
