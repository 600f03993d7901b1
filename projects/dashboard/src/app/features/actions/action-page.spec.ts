import { signal } from '@angular/core';
import type { Role } from '#shared/domain/vocabulary';
import { actionOf, effectOf } from '../../testing/action-answers';
import { openPage } from '../../testing/open-page';
import { ActionPage } from './action-page';

const URL = '/api/branches/HAV/actions/3';

async function open(role: Role, action = actionOf(3), effect = effectOf()) {
  const { http, settle, host } = await openPage(ActionPage, {
    url: '/actions/HAV/3',
    role,
    catalogue: { branches: signal([]), branchName: () => 'Havnsund' },
    inputs: { branch: 'HAV', id: '3' },
  });
  http.expectOne(URL).flush({ ...action, effect });
  await settle();
  const press = async (words: RegExp): Promise<void> => {
    [...host.querySelectorAll('button')].find((one) => words.test(one.textContent))!.click();
    await settle();
  };
  const type = async (selector: string, text: string): Promise<void> => {
    const field = host.querySelector<HTMLInputElement>(selector)!;
    field.value = text;
    field.dispatchEvent(new Event('input', { bubbles: true }));
    await settle();
  };
  const submit = async (form: string): Promise<void> => {
    host
      .querySelector(`${form} form`)!
      .dispatchEvent(new Event('submit', { cancelable: true, bubbles: true }));
    await settle();
  };
  const refuse = async (method: string, url: string, status: number, body: object = {}) => {
    const request = http.expectOne({ method, url });
    if (status === 0) request.error(new ProgressEvent('error'));
    else request.flush(body, { status, statusText: 'no' });
    await settle();
  };
  return { http, host, settle, press, type, submit, refuse };
}

describe('ActionPage', () => {
  beforeEach(() => sessionStorage.clear());

  it('opened, says what the figure did, what was agreed, and draws before and after', async () => {
    const { host } = await open('regional_lead');
    expect(host.querySelector('h1')?.textContent).toContain('overran 6 points less');
    expect(host.querySelector('.agreed')?.textContent).toContain('New clips before refit');
    expect(host.querySelector('us-dot-interval-chart')).not.toBeNull();
  });

  it('past its day, says late in words', async () => {
    const { host } = await open('site_manager', actionOf(3, { late: true, until: '2026-01-20' }));
    expect(host.querySelector('.late')?.textContent).toContain('late, was due');
  });

  it('that cannot be told yet, says why and draws nothing', async () => {
    const none = { ...effectOf().after, cars: 1, value: null, lower: null, upper: null };
    const effect = effectOf({ before: none, after: none, change: null, lower: null, upper: null });
    const { host } = await open('site_manager', actionOf(3), effect);
    expect(host.querySelector('h1')?.textContent).toContain('cannot be told yet');
    expect(host.querySelector('us-dot-interval-chart')).toBeNull();
  });

  it('answered by the manager, sends the words, says so and shows the thread in order', async () => {
    const { http, host, type, submit, settle } = await open('site_manager');
    await type('[name=text]', ' clips are in ');
    await submit('us-answer-form');
    const request = http.expectOne(`${URL}/answers`);
    expect(request.request.body).toEqual({ text: 'clips are in' });
    const answers = [
      { by: 'Ilse', at: '2026-01-10T08:00:00Z', text: 'ordered' },
      { by: 'Ilse', at: '2026-02-02T08:00:00Z', text: 'clips are in' },
    ];
    request.flush(actionOf(3, { answers }));
    await settle();
    http.expectOne(URL).flush({ ...actionOf(3, { answers }), effect: effectOf() });
    await settle();
    expect([...host.querySelectorAll('li .text')].map((one) => one.textContent)).toEqual([
      'ordered',
      'clips are in',
    ]);
    expect(host.querySelector('.us-done')?.textContent).toContain('Your answer is with the action');
    expect(host.querySelector<HTMLTextAreaElement>('[name=text]')?.value).toBe('');
    expect(sessionStorage).toHaveLength(0);
  });

  it.each([422, 409, 0])('an answer refused with %d, keeps what was typed', async (status) => {
    const { host, type, submit, refuse } = await open('site_manager');
    await type('[name=text]', 'clips are in');
    await submit('us-answer-form');
    await refuse('POST', `${URL}/answers`, status, {
      detail: 'It ended',
      problems: [{ path: '/text', message: 'must not be empty' }],
    });
    expect(host.querySelector<HTMLTextAreaElement>('[name=text]')?.value).toBe('clips are in');
    expect(host.querySelector('us-answer-form [role=alert]')?.textContent).toContain('kept here');
  });

  it('marked as done by the lead, says so and reads it anew', async () => {
    const { http, host, press, settle } = await open('regional_lead');
    await press(/It is done/);
    const request = http.expectOne({ method: 'PUT', url: URL });
    expect(request.request.body).toEqual({ state: 'done' });
    const done = actionOf(3, { state: 'done', endedOn: '2026-02-02' });
    request.flush(done);
    await settle();
    http.expectOne(URL).flush({ ...done, effect: effectOf() });
    await settle();
    expect(host.querySelector('.us-done')?.textContent).toContain('marked as done');
    expect(host.textContent).toContain('Take it up again');
  });

  it('changed by the lead, sends only what was changed; refused, keeps it at its field', async () => {
    const { http, host, press, type, submit } = await open('head_office');
    await press(/Change it/);
    await type('[formControlName=who]', 'Bo');
    await submit('us-action-form');
    const request = http.expectOne({ method: 'PUT', url: URL });
    expect(request.request.body).toEqual({ who: 'Bo' });
    request.flush(
      { problems: [{ path: '/who', message: 'nobody of that name' }] },
      { status: 422, statusText: 'no' },
    );
    await new Promise((done) => setTimeout(done));
    await press(/Save the change/);
    expect(host.querySelector<HTMLInputElement>('[formControlName=who]')?.value).toBe('Bo');
    expect(host.querySelector('us-action-form')?.textContent).toContain('kept here');
  });

  it('to a manager, offers no end and no change; to a lead no answer', async () => {
    const manager = await open('site_manager');
    expect(manager.host.textContent).not.toContain('It is done');
    expect(manager.host.querySelector('us-answer-form')).not.toBeNull();
  });

  it('to a lead, has no form to answer as the branch', async () => {
    const { host } = await open('regional_lead');
    expect(host.querySelector('us-answer-form')).toBeNull();
  });

  it('about a signal, tells which', async () => {
    const { http, host, settle } = await open('regional_lead', actionOf(3, { signal: 7 }));
    const { signalOf } = await import('../../testing/signal-answers');
    http.expectOne('/api/branches/HAV/signals/7').flush({ ...signalOf(7), listed: [] });
    await settle();
    expect(host.textContent).toContain('Answers the signal');
  });
});
