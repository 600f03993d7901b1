import { HttpErrorResponse } from '@angular/common/http';
import {
  EnvironmentInjector,
  createEnvironmentInjector,
  runInInjectionContext,
} from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { Subject } from 'rxjs';
import type { Upload } from './api';
import { sending } from './sending';

function set() {
  const steps = new Subject<Upload<string>>();
  const injector = createEnvironmentInjector([], TestBed.inject(EnvironmentInjector));
  const file = runInInjectionContext(injector, () => sending(() => steps));
  return { steps, file, leave: () => injector.destroy() };
}

describe('sending', () => {
  it('a file on its way, tells how much has gone, then gives the answer and is idle', async () => {
    const { steps, file } = set();
    const answer = file.run('file');
    expect(file.gone()).toEqual({ bytes: 0, of: undefined });
    steps.next({ kind: 'going', bytes: 512, of: 2048 });
    expect(file.gone()).toEqual({ bytes: 512, of: 2048 });
    steps.next({ kind: 'answered', answer: { body: 'read', etag: undefined, status: 201 } });
    steps.complete();
    expect((await answer)?.body).toBe('read');
    expect(file.gone()).toBeUndefined();
  });

  it('called back, ends without an answer and without a problem', async () => {
    const { steps, file } = set();
    const answer = file.run('file');
    file.cancel();
    expect(await answer).toBeUndefined();
    expect(steps.observed).toBe(false);
    expect(file.problem()).toBeUndefined();
  });

  it('its page left, is called back', async () => {
    const { steps, file, leave } = set();
    void file.run('file');
    leave();
    expect(steps.observed).toBe(false);
  });

  it('refused, says why until the next try', async () => {
    const { steps, file } = set();
    const answer = file.run('file');
    steps.error(
      new HttpErrorResponse({ status: 413, error: { detail: 'A file has at most 50 MB.' } }),
    );
    expect(await answer).toBeUndefined();
    expect(file.problem()?.sentence).toBe('A file has at most 50 MB.');
    file.clear();
    expect(file.problem()).toBeUndefined();
  });
});
