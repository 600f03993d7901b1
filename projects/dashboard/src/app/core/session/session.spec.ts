import { HttpClient, HttpContext, provideHttpClient, withInterceptors } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { TestBed } from '@angular/core/testing';
import { provideRouter, Router } from '@angular/router';
import { NEEDS_TOKEN } from '../api/needs-token';
import { Session } from './session';
import { tokenInterceptor } from './token-interceptor';

const PERSON = {
  id: 7,
  email: 'manager@example.test',
  name: 'Ilse Torven',
  role: 'site_manager' as const,
  regions: [],
  branches: ['HAV'],
};
const granted = (accessToken: string) => ({ accessToken, expiresInSeconds: 600, person: PERSON });
const refused = { status: 401, statusText: 'Unauthorized' };

/** Lets promises that wait for an answer go on. */
const settle = () => new Promise((resolve) => setTimeout(resolve));

function set() {
  TestBed.configureTestingModule({
    providers: [
      provideHttpClient(withInterceptors([tokenInterceptor])),
      provideHttpClientTesting(),
      provideRouter([]),
    ],
  });
  const server = TestBed.inject(HttpTestingController);
  const http = TestBed.inject(HttpClient);
  const get = (url: string) => {
    const outcome: { value?: unknown; error?: { status: number } } = {};
    http
      .get(url, { context: new HttpContext().set(NEEDS_TOKEN, true) })
      .subscribe({ next: (value) => (outcome.value = value), error: (e) => (outcome.error = e) });
    return outcome;
  };
  return { server, session: TestBed.inject(Session), router: TestBed.inject(Router), get };
}

describe('Session', () => {
  it('at the start, with a good cookie, knows who it is', async () => {
    const { server, session } = set();
    const renewed = session.renew();
    server.expectOne('/api/auth/refresh').flush(granted('one'));
    expect(await renewed).toBe('one');
    expect(session.person()?.name).toBe('Ilse Torven');
  });

  it('at the start, with no cookie, knows nobody and reports no trouble', async () => {
    const { server, session } = set();
    const renewed = session.renew();
    server.expectOne('/api/auth/refresh').flush({}, refused);
    expect(await renewed).toBeUndefined();
    expect(session.person()).toBeUndefined();
    expect(session.resumeProblem()).toBeUndefined();
  });

  it('asked by three calls at once exchanges the cookie once', async () => {
    const { server, get } = set();
    get('/api/a');
    get('/api/b');
    get('/api/c');
    await settle();
    server.expectOne('/api/auth/refresh').flush(granted('one'));
    await settle();
    for (const url of ['/api/a', '/api/b', '/api/c']) {
      const request = server.expectOne(url).request;
      expect(request.headers.get('Authorization')).toBe('Bearer one');
    }
    server.verify();
  });

  it('with a token in hand does not ask for another', async () => {
    const { server, session, get } = set();
    const renewed = session.renew();
    server.expectOne('/api/auth/refresh').flush(granted('one'));
    await renewed;
    get('/api/a');
    await settle();
    server.expectNone('/api/auth/refresh');
    expect(server.expectOne('/api/a').request.headers.get('Authorization')).toBe('Bearer one');
  });

  it('refused with 401 renews once and tries the call again with the new token', async () => {
    const { server, session, get } = set();
    const renewed = session.renew();
    server.expectOne('/api/auth/refresh').flush(granted('one'));
    await renewed;
    const outcome = get('/api/a');
    await settle();
    server.expectOne('/api/a').flush({}, refused);
    await settle();
    server.expectOne('/api/auth/refresh').flush(granted('two'));
    await settle();
    const again = server.expectOne('/api/a');
    expect(again.request.headers.get('Authorization')).toBe('Bearer two');
    again.flush({ ok: true });
    expect(outcome.value).toEqual({ ok: true });
  });

  it('refused with 401 twice running does not go round in circles', async () => {
    const { server, session, get } = set();
    const renewed = session.renew();
    server.expectOne('/api/auth/refresh').flush(granted('one'));
    await renewed;
    const outcome = get('/api/a');
    await settle();
    server.expectOne('/api/a').flush({}, refused);
    await settle();
    server.expectOne('/api/auth/refresh').flush(granted('two'));
    await settle();
    server.expectOne('/api/a').flush({}, refused);
    await settle();
    server.verify();
    expect(outcome.error?.status).toBe(401);
  });

  it('ended on the server forgets the person and asks to sign in', async () => {
    const { server, session, router, get } = set();
    const went = jest.spyOn(router, 'navigate').mockResolvedValue(true);
    const renewed = session.renew();
    server.expectOne('/api/auth/refresh').flush(granted('one'));
    await renewed;
    get('/api/a');
    await settle();
    server.expectOne('/api/a').flush({}, refused);
    await settle();
    server.expectOne('/api/auth/refresh').flush({}, refused);
    await settle();
    expect(session.person()).toBeUndefined();
    expect(went).toHaveBeenCalledWith(['/sign-in'], { queryParams: {} });
  });

  it('without a line while renewing signs nobody out', async () => {
    const { server, session } = set();
    const first = session.renew();
    server.expectOne('/api/auth/refresh').flush(granted('one'));
    await first;
    const second = session.renew();
    server.expectOne('/api/auth/refresh').error(new ProgressEvent('error'));
    expect(await second).toBeUndefined();
    expect(session.person()?.id).toBe(7);
    expect(session.resumeProblem()?.status).toBe(0);
  });

  describe('opened on a device where somebody was signed in', () => {
    afterEach(() => localStorage.clear());

    async function opened() {
      const { server, session, router, get } = set();
      localStorage.setItem('underseam.person', JSON.stringify(PERSON));
      const resumed = session.resume();
      return { server, session, router, get, resumed };
    }

    it('without a line, goes on with that person and no token', async () => {
      const { server, session, resumed } = await opened();
      server.expectOne('/api/auth/refresh').error(new ProgressEvent('error'));
      await resumed;
      expect(session.person()).toEqual(PERSON);
      const token = session.usableToken();
      server.expectOne('/api/auth/refresh').error(new ProgressEvent('error'));
      expect(await token).toBeUndefined();
    });

    it('with a sign-in that has ended, knows nobody and forgets who it was', async () => {
      const { server, session, resumed } = await opened();
      server.expectOne('/api/auth/refresh').flush({}, refused);
      await resumed;
      expect(session.person()).toBeUndefined();
      expect(localStorage.getItem('underseam.person')).toBeNull();
    });

    it('told too late that the sign-in has ended, asks to sign in', async () => {
      jest.useFakeTimers();
      const { server, session, router, resumed } = await opened();
      const went = jest.spyOn(router, 'navigate').mockResolvedValue(true);
      await jest.advanceTimersByTimeAsync(4_001);
      await resumed;
      expect(session.person()?.id).toBe(7);
      server.expectOne('/api/auth/refresh').flush({}, refused);
      await jest.advanceTimersByTimeAsync(1);
      jest.useRealTimers();
      expect(session.person()).toBeUndefined();
      expect(went).toHaveBeenCalledWith(['/sign-in'], { queryParams: {} });
    });
  });

  it('signed in, leaves the person on the device without a token, and takes them away at sign-out', async () => {
    const { server, session, router } = set();
    jest.spyOn(router, 'navigate').mockResolvedValue(true);
    const renewed = session.renew();
    server.expectOne('/api/auth/refresh').flush(granted('one'));
    await renewed;
    expect(JSON.parse(localStorage.getItem('underseam.person')!)).toEqual(PERSON);
    session.signOut().subscribe();
    server.expectOne('/api/auth/sign-out').flush(null);
    expect(localStorage.getItem('underseam.person')).toBeNull();
  });
});
