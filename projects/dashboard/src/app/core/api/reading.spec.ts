import { HttpErrorResponse } from '@angular/common/http';
import { ApplicationRef, Injector, runInInjectionContext, signal } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { of, Subject } from 'rxjs';
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

  const shownOne = async () => {
    const given = set();
    given.asked.set({ branch: 'HAV' });
    TestBed.tick();
    answer(given.calls[0], 'one');
    await given.settle();
    expect(given.reading.value()).toBe('one');
    return given;
  };

  it('refreshed shows the former answer as if nothing were under way, then the newer one', async () => {
    const { calls, reading, settle } = await shownOne();
    reading.refresh();
    TestBed.tick();
    expect(reading.asking()).toBe(true);
    expect([reading.value(), reading.loading(), reading.refreshing()]).toEqual([
      'one',
      false,
      false,
    ]);
    answer(calls[1], 'two');
    await settle();
    expect([reading.value(), reading.asking(), reading.outdated()]).toEqual(['two', false, false]);
  });

  it('refreshed in vain keeps the former answer without a word, and knows that it is outdated', async () => {
    const { calls, reading, settle } = await shownOne();
    reading.refresh();
    TestBed.tick();
    calls[1]?.answer.error(new HttpErrorResponse({ status: 0 }));
    await settle();
    expect([reading.value(), reading.problem(), reading.outdated()]).toEqual([
      'one',
      undefined,
      true,
    ]);
    // What a person asks for is noticed again.
    reading.reload();
    TestBed.tick();
    expect([reading.value(), reading.refreshing()]).toEqual(['one', true]);
    calls[2]?.answer.error(new HttpErrorResponse({ status: 403 }));
    await settle();
    expect([reading.value(), reading.problem()?.status]).toEqual([undefined, 403]);
  });

  it('refreshed in vain and then asked something else, waits for that as usual', async () => {
    const { asked, calls, reading, settle } = await shownOne();
    reading.refresh();
    TestBed.tick();
    calls[1]?.answer.error(new HttpErrorResponse({ status: 0 }));
    await settle();
    asked.set({ branch: 'TAN' });
    TestBed.tick();
    expect([reading.value(), reading.refreshing(), reading.outdated()]).toEqual([
      'one',
      true,
      false,
    ]);
    calls[2]?.answer.error(new HttpErrorResponse({ status: 403 }));
    await settle();
    expect(reading.problem()?.status).toBe(403);
  });

  it('refreshed while an answer is under way makes no second call', async () => {
    const { asked, calls, reading } = await shownOne();
    asked.set({ branch: 'TAN' });
    TestBed.tick();
    reading.refresh();
    TestBed.tick();
    expect(calls).toHaveLength(2);
    expect(reading.refreshing()).toBe(true);
  });

  it('refreshed with the same answer keeps the very object, so that nothing is drawn again', async () => {
    const asked = signal({ branch: 'HAV' });
    const answers = [{ cars: 11 }, { cars: 11 }, { cars: 12 }];
    const reading = runInInjectionContext(TestBed.inject(Injector), () =>
      readingOf(asked, () => of({ body: answers.shift(), etag: undefined, status: 200 })),
    );
    const settle = () => TestBed.inject(ApplicationRef).whenStable();
    TestBed.tick();
    await settle();
    const first = reading.value();
    reading.refresh();
    TestBed.tick();
    await settle();
    expect(answers).toHaveLength(1);
    expect(reading.value()).toBe(first);
    reading.refresh();
    TestBed.tick();
    await settle();
    expect(reading.value()).toEqual({ cars: 12 });
  });
});
