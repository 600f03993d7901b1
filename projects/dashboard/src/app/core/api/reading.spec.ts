import { HttpErrorResponse } from '@angular/common/http';
import { ApplicationRef, Injector, runInInjectionContext, signal } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { Subject } from 'rxjs';
import type { Answer } from './api';
import { readingOf } from './reading';

function set() {
  const asked = signal<{ branch: string } | undefined>(undefined);
  const calls: { branch: string; answer: Subject<Answer<string>> }[] = [];
  const reading = runInInjectionContext(TestBed.inject(Injector), () =>
    readingOf(asked, (request) => {
      const answer = new Subject<Answer<string>>();
      calls.push({ branch: request.branch, answer });
      return answer;
    }),
  );
  const settle = () => TestBed.inject(ApplicationRef).whenStable();
  return { asked, calls, reading, settle };
}

function answer(call: { answer: Subject<Answer<string>> } | undefined, body: string): void {
  call?.answer.next({ body, etag: `"${body}"`, status: 200 });
  call?.answer.complete();
}

describe('readingOf', () => {
  it('without a request makes no call and has nothing', async () => {
    const { calls, reading } = set();
    TestBed.tick();
    expect(calls).toHaveLength(0);
    expect(reading.loading()).toBe(false);
    expect(reading.value()).toBeUndefined();
  });

  it('with a request is loading, then ready with its ETag', async () => {
    const { asked, calls, reading, settle } = set();
    asked.set({ branch: 'HAV' });
    TestBed.tick();
    expect(reading.loading()).toBe(true);
    answer(calls[0], 'one');
    await settle();
    expect(reading.value()).toBe('one');
    expect(reading.etag()).toBe('"one"');
    expect(reading.loading()).toBe(false);
  });

  it('with an equal request again makes no second call', async () => {
    const { asked, calls, settle } = set();
    asked.set({ branch: 'HAV' });
    TestBed.tick();
    answer(calls[0], 'one');
    await settle();
    asked.set({ branch: 'HAV' });
    TestBed.tick();
    expect(calls).toHaveLength(1);
  });

  it('with another request keeps the former answer while it waits', async () => {
    const { asked, calls, reading, settle } = set();
    asked.set({ branch: 'HAV' });
    TestBed.tick();
    answer(calls[0], 'one');
    await settle();
    // As a page does: a linked signal remembers only what was looked at.
    expect(reading.value()).toBe('one');
    asked.set({ branch: 'TAN' });
    TestBed.tick();
    expect(reading.value()).toBe('one');
    expect(reading.refreshing()).toBe(true);
    expect(reading.loading()).toBe(false);
    answer(calls[1], 'two');
    await settle();
    expect(reading.value()).toBe('two');
  });

  it('with a failed call drops the former answer and says why', async () => {
    const { asked, calls, reading, settle } = set();
    asked.set({ branch: 'HAV' });
    TestBed.tick();
    answer(calls[0], 'one');
    await settle();
    asked.set({ branch: 'TAN' });
    TestBed.tick();
    calls[1]?.answer.error(new HttpErrorResponse({ status: 403 }));
    await settle();
    expect(reading.value()).toBeUndefined();
    expect(reading.problem()?.status).toBe(403);
  });
});
