import { signal } from '@angular/core';
import type { Role } from '#shared/domain/vocabulary';
import { openPage } from '../../testing/open-page';
import { dangerSignal, signalList, signalOf } from '../../testing/signal-answers';
import { SignalsPage } from './signals-page';

const BRANCHES = [
  { code: 'HAV', name: 'Havnsund', region: 'SOUND' },
  { code: 'TAN', name: 'Tangvarp', region: 'SOUND' },
];

async function open(role: Role, url = '/signals', inputs: Record<string, string> = {}) {
  const { http, settle, host } = await openPage(SignalsPage, {
    url,
    role,
    catalogue: {
      branches: signal(BRANCHES),
      branchName: (code: string) => BRANCHES.find((one) => one.code === code)?.name ?? code,
    },
    inputs,
  });
  const answer = async (body: object): Promise<URL> => {
    const request = http.expectOne(({ url: asked }) => asked.startsWith('/api/signals'));
    request.flush(body);
    await settle();
    return new URL(request.request.urlWithParams, 'http://app');
  };
  const press = async (words: RegExp): Promise<void> => {
    [...host.querySelectorAll('button')].find((one) => words.test(one.textContent))!.click();
    await settle();
  };
  const note = (): HTMLTextAreaElement => host.querySelector<HTMLTextAreaElement>('textarea')!;
  const write = async (text: string): Promise<void> => {
    note().value = text;
    note().dispatchEvent(new Event('input', { bubbles: true }));
    await settle();
  };
  const send = async (): Promise<void> => {
    host
      .querySelector('us-acknowledge-form form')!
      .dispatchEvent(new Event('submit', { cancelable: true }));
    await settle();
  };
  return { http, host, settle, answer, press, note, write, send };
}
const headings = (host: HTMLElement): string[] =>
  [...host.querySelectorAll('h2')].map((one) => one.textContent.trim());

describe('SignalsPage', () => {
  beforeEach(() => sessionStorage.clear());

  it('opened, asks for the branches, state and kind of the URL', async () => {
    const { answer } = await open('site_manager', '/signals?branch=HAV&state=over&kind=unbilled', {
      state: 'over',
      kind: 'unbilled',
    });
    const url = await answer(signalList([]));
    expect([...url.searchParams]).toEqual([
      ['branch', 'HAV'],
      ['state', 'over'],
      ['kind', 'unbilled'],
      ['limit', '200'],
    ]);
  });

  it('with a danger among others, tells the danger first with its caution, the rest by branch', async () => {
    const { host, answer } = await open('regional_lead');
    await answer(
      signalList([dangerSignal(1, { branch: 'TAN' }), signalOf(2), signalOf(3, { branch: 'TAN' })]),
    );
    expect(headings(host)).toEqual(['Can hurt somebody', 'Havnsund', 'Tangvarp']);
    expect(host.querySelector('us-caution')?.textContent).toContain('tell the owner in writing');
    expect(host.querySelectorAll('us-danger-sign')).toHaveLength(1);
  });

  it('with no danger, shows nothing in the colour of danger', async () => {
    const { host, answer } = await open('regional_lead');
    await answer(signalList([signalOf(2)]));
    expect(host.querySelector('us-caution, us-danger-sign')).toBeNull();
  });

  it('with nothing to tell, says what is looked for and where false alarms are told', async () => {
    const { host, answer } = await open('site_manager');
    await answer(signalList([]));
    expect(host.querySelector('h1')?.textContent).toContain('Nothing stands out');
    expect(host.querySelectorAll('.looked li')).toHaveLength(9);
    expect(host.querySelector('.looked a[href$="#false-alarms"]')).not.toBeNull();
  });

  it('cars behind one asked for, lists each with its job sheet and what is wrong', async () => {
    const { http, host, answer, press, settle } = await open('site_manager');
    await answer(signalList([signalOf(7)]));
    await press(/The 5 cars behind it/);
    http.expectOne('/api/branches/HAV/signals/7').flush({
      ...signalOf(7),
      listed: [
        {
          jobRef: '0398',
          make: 'Hask',
          model: 'Mulde',
          firstRegistered: '2008-04',
          completedOn: '2026-01-10',
          why: '23 days without a bill',
        },
      ],
    });
    await settle();
    expect(host.querySelector('us-signal-cars a')?.getAttribute('href')).toBe('/jobs/HAV/0398');
    expect(host.querySelector('us-signal-cars')?.textContent).toContain('23 days without a bill');
    expect(host.querySelector('us-signal-cars')?.textContent).toContain('4 more cars');
  });

  it('acknowledged with a note, sends it, says so and reads the list anew', async () => {
    const { http, host, answer, press, write, send, settle } = await open('site_manager');
    await answer(signalList([signalOf(7)]));
    await press(/Note that it was seen/);
    await write(' bills go out today ');
    await send();
    const request = http.expectOne('/api/branches/HAV/signals/7/acknowledgement');
    expect(request.request.body).toEqual({ note: 'bills go out today' });
    const acknowledged = { by: 'Ilse', at: '2026-02-02T06:30:00Z', note: 'bills go out today' };
    request.flush(signalOf(7, { state: 'acknowledged', acknowledged }));
    await settle();
    await answer(signalList([signalOf(7, { state: 'acknowledged', acknowledged })]));
    expect(host.querySelector('.us-done')?.textContent).toContain('Noted as seen');
    expect(host.querySelector('blockquote')?.textContent).toBe('bills go out today');
    expect(sessionStorage).toHaveLength(0);
  });

  it.each([
    [
      422,
      { problems: [{ path: '/note', message: 'at most 4000 characters' }] },
      'at most 4000 characters',
    ],
    [409, { detail: 'It is over since the last look' }, 'It is over since the last look'],
    [0, undefined, 'No answer from the server'],
  ])(
    'a note refused with %d, keeps what was typed, also for the next opening',
    async (status, body, said) => {
      const { http, host, answer, press, write, send, settle, note } = await open('site_manager');
      await answer(signalList([signalOf(7)]));
      await press(/Note that it was seen/);
      await write('bills go out today');
      await send();
      const request = http.expectOne('/api/branches/HAV/signals/7/acknowledgement');
      if (status === 0) request.error(new ProgressEvent('error'));
      else request.flush(body ?? {}, { status, statusText: 'no' });
      await settle();
      expect(host.querySelector('us-acknowledge-form [role=alert]')?.textContent).toContain(said);
      expect(note().value).toBe('bills go out today');
      await press(/Close the note/);
      await press(/Go on with the note/);
      expect(note().value).toBe('bills go out today');
    },
  );

  it('a note of nothing, is not sent', async () => {
    const { http, host, answer, press, send } = await open('site_manager');
    await answer(signalList([signalOf(7)]));
    await press(/Note that it was seen/);
    await send();
    http.expectNone('/api/branches/HAV/signals/7/acknowledgement');
    expect(host.querySelector('[role=alert]')?.textContent).toContain('Say in a few words');
  });

  it('to a lead, leads to the form of an action filled from the signal; to a manager not', async () => {
    const lead = await open('regional_lead');
    await lead.answer(
      signalList([
        signalOf(7, { kind: 'drift_overrun', facts: { ratio: 1.3, usualRatio: 1.1, weeks: 6 } }),
      ]),
    );
    expect(lead.host.querySelector('a[href^="/actions/new"]')?.getAttribute('href')).toBe(
      '/actions/new?branch=HAV&measure=overrun&signal=7',
    );
  });

  it('to a manager, offers no action to agree', async () => {
    const { host, answer } = await open('site_manager');
    await answer(signalList([signalOf(7)]));
    expect(host.querySelector('a[href^="/actions/new"]')).toBeNull();
  });

  it('that cannot be read, says so and offers to try again', async () => {
    const { http, host, settle } = await open('site_manager');
    http
      .expectOne(({ url }) => url.startsWith('/api/signals'))
      .flush({}, { status: 500, statusText: 'Server error' });
    await settle();
    expect(host.querySelector('[role=alert]')?.textContent).toContain('Try again');
  });
});
