import { LiveAnnouncer } from '@angular/cdk/a11y';
import { TestBed } from '@angular/core/testing';
import type { LiveEvent } from '#shared/contracts/live';
import { Catalogue } from '../catalogue/catalogue';
import { LiveLine } from './live-line';
import { LiveNews } from './live-news';

const jobs = (count: number): LiveEvent => ({ kind: 'jobs', branch: 'HAV', count, added: count });

function set() {
  const announced: [string, string][] = [];
  const announcer = { announce: (...words: [string, string]) => announced.push(words) };
  TestBed.configureTestingModule({
    providers: [
      { provide: LiveAnnouncer, useValue: announcer },
      { provide: Catalogue, useValue: { branchName: () => 'Havnsund' } },
    ],
  });
  const fixture = TestBed.createComponent(LiveLine);
  const host = fixture.nativeElement as HTMLElement;
  const shown = (): string => {
    fixture.detectChanges();
    return host.textContent.trim();
  };
  return { announced, news: TestBed.inject(LiveNews), shown };
}

beforeEach(() => jest.useFakeTimers({ now: new Date(2026, 1, 2, 8, 12) }));
afterEach(() => {
  TestBed.resetTestingModule();
  jest.useRealTimers();
});

describe('LiveNews', () => {
  it('given what has come in, shows it in a quiet line and says it once, politely', () => {
    const { announced, news, shown } = set();
    news.tell([jobs(3)]);
    jest.advanceTimersByTime(0);
    expect(shown()).toMatch(/^3 new jobs from Havnsund, 0?8:12/);
    expect(announced).toEqual([[shown(), 'polite']]);
  });

  it('given more within ten seconds, says it together and not before', () => {
    const { announced, news, shown } = set();
    news.tell([jobs(1)]);
    jest.advanceTimersByTime(0);
    for (let n = 0; n < 20; n += 1) {
      news.tell([jobs(2)]);
      jest.advanceTimersByTime(450);
    }
    expect(announced).toHaveLength(1);
    jest.advanceTimersByTime(1_000);
    expect(announced).toHaveLength(2);
    expect(shown()).toMatch(/^40 new jobs/);
  });

  it('given the same event from two readings of a page, says it once', () => {
    const { announced, news } = set();
    const event = jobs(1);
    news.tell([event]);
    news.tell([event]);
    jest.advanceTimersByTime(60_000);
    expect(announced.map(([sentence]) => sentence.slice(0, 9))).toEqual(['1 new job']);
  });

  it('given what the person did themselves, says nothing of it, and others’ as ever', () => {
    const { announced, news, shown } = set();
    news.tell([{ ...jobs(2), own: true }]);
    jest.advanceTimersByTime(60_000);
    expect([shown(), announced]).toEqual(['', []]);
    news.tell([{ ...jobs(2), own: true }, jobs(3)]);
    jest.advanceTimersByTime(0);
    expect(shown()).toMatch(/^3 new jobs from Havnsund/);
    expect(announced).toHaveLength(1);
  });

  it('after it could be read, takes the line away', () => {
    const { news, shown } = set();
    news.tell([jobs(1)]);
    jest.advanceTimersByTime(19_000);
    expect(shown()).not.toBe('');
    jest.advanceTimersByTime(2_000);
    expect(shown()).toBe('');
  });
});
