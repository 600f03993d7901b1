import { signal } from '@angular/core';
import type { Role } from '#shared/domain/vocabulary';
import { actionList, actionOf } from '../../testing/action-answers';
import { openPage } from '../../testing/open-page';
import { ActionsPage } from './actions-page';

async function open(role: Role, url = '/actions', inputs: Record<string, string> = {}) {
  const { http, settle, host } = await openPage(ActionsPage, {
    url,
    role,
    catalogue: {
      branches: signal([{ code: 'HAV', name: 'Havnsund', region: 'SOUND' }]),
      branchName: () => 'Havnsund',
    },
    inputs,
  });
  const answer = async (body: object): Promise<URL> => {
    const request = http.expectOne(({ url: asked }) => asked.startsWith('/api/actions'));
    request.flush(body);
    await settle();
    return new URL(request.request.urlWithParams, 'http://app');
  };
  return { http, host, answer, settle };
}

describe('ActionsPage', () => {
  it('opened, asks for the branches and state of the URL', async () => {
    const { answer } = await open('site_manager', '/actions?branch=HAV&state=done', {
      state: 'done',
    });
    expect([...(await answer(actionList([]))).searchParams]).toEqual([
      ['branch', 'HAV'],
      ['state', 'done'],
      ['limit', '100'],
    ]);
  });

  it('with one late, says it in the answer and in its row', async () => {
    const { host, answer } = await open('regional_lead');
    await answer(actionList([actionOf(1, { late: true, until: '2026-01-20' }), actionOf(2)]));
    expect(host.querySelector('h1')?.textContent).toContain(
      '2 actions are under way in Havnsund; 1 is late.',
    );
    expect(host.querySelectorAll('tbody .late')).toHaveLength(1);
    expect(host.querySelector('tbody a')?.getAttribute('href')).toBe('/actions/HAV/1');
  });

  it('with none, tells a lead how one comes about and a manager who agrees it', async () => {
    const lead = await open('regional_lead');
    await lead.answer(actionList([]));
    expect(lead.host.textContent).toContain('Agree one from a signal');
    expect(lead.host.querySelector('a[href^="/actions/new"]')).not.toBeNull();
  });

  it('to a manager, offers no form to agree one', async () => {
    const { host, answer } = await open('site_manager');
    await answer(actionList([]));
    expect(host.querySelector('a[href^="/actions/new"]')).toBeNull();
    expect(host.textContent).toContain('agrees them with you');
  });

  it('that cannot be read, says so and offers to try again', async () => {
    const { http, host, settle } = await open('site_manager');
    http
      .expectOne(({ url }) => url.startsWith('/api/actions'))
      .flush({}, { status: 500, statusText: 'Server error' });
    await settle();
    expect(host.querySelector('[role=alert]')?.textContent).toContain('Try again');
  });
});
