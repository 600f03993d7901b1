import { HttpClient, provideHttpClient, withInterceptors } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { signal } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { forgetAnswers } from '../offline/kept-answers';
import { keptAnswersInterceptor } from './kept-answers-interceptor';
import { Session } from './session';

const USUAL = '/api/branches/HAV/usual?make=Velder&model=Tessock';
const person = signal<{ id: number } | undefined>(undefined);

function set() {
  person.set({ id: 7 });
  TestBed.configureTestingModule({
    providers: [
      provideHttpClient(withInterceptors([keptAnswersInterceptor])),
      provideHttpClientTesting(),
      { provide: Session, useValue: { person } },
    ],
  });
  const server = TestBed.inject(HttpTestingController);
  const http = TestBed.inject(HttpClient);
  const get = (url: string) => {
    const outcome: { value?: unknown; error?: { status: number } } = {};
    http
      .get(url)
      .subscribe({ next: (value) => (outcome.value = value), error: (e) => (outcome.error = e) });
    return outcome;
  };
  const noLine = (url: string) => server.expectOne(url).error(new ProgressEvent('error'));
  return { server, get, noLine };
}
afterEach(() => localStorage.clear());

describe('keptAnswersInterceptor', () => {
  it('without a line, gives the answer that came last', () => {
    const { server, get, noLine } = set();
    get(USUAL);
    server.expectOne(USUAL).flush({ total: 1 });
    get(USUAL);
    server.expectOne(USUAL).flush({ total: 2 });
    const offline = get(USUAL);
    noLine(USUAL);
    expect(offline.value).toEqual({ total: 2 });
  });

  it('without a line, gives another person nothing of it', () => {
    const { server, get, noLine } = set();
    get(USUAL);
    server.expectOne(USUAL).flush({ total: 1 });
    person.set({ id: 8 });
    const offline = get(USUAL);
    noLine(USUAL);
    expect(offline.error?.status).toBe(0);
  });

  it('given an answer that refuses, does not hide it behind a kept one', () => {
    const { server, get } = set();
    get('/api/catalogue');
    server.expectOne('/api/catalogue').flush({ today: '2026-02-02' });
    const refused = get('/api/catalogue');
    server.expectOne('/api/catalogue').flush({}, { status: 403, statusText: 'Forbidden' });
    expect(refused.error?.status).toBe(403);
  });

  it('keeps nothing of other calls', () => {
    const { server, get, noLine } = set();
    get('/api/jobs');
    server.expectOne('/api/jobs').flush({ items: [] });
    const offline = get('/api/jobs');
    noLine('/api/jobs');
    expect(offline.error?.status).toBe(0);
  });

  it('on a later day, gives the catalogue with today moved on', () => {
    jest.useFakeTimers({ now: new Date('2026-02-02T09:00:00Z') });
    const { server, get, noLine } = set();
    get('/api/catalogue');
    server.expectOne('/api/catalogue').flush({ today: '2026-02-02' });
    jest.setSystemTime(new Date('2026-02-05T09:00:00Z'));
    const offline = get('/api/catalogue');
    noLine('/api/catalogue');
    jest.useRealTimers();
    expect(offline.value).toEqual({ today: '2026-02-05' });
  });

  it('once forgotten, gives nothing', () => {
    const { server, get, noLine } = set();
    get(USUAL);
    server.expectOne(USUAL).flush({ total: 1 });
    forgetAnswers();
    const offline = get(USUAL);
    noLine(USUAL);
    expect(offline.error?.status).toBe(0);
  });
});
