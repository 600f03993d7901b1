import { provideHttpClient, withInterceptors } from '@angular/common/http';
import { TestBed } from '@angular/core/testing';
import { Api } from '../../core/api/api';
import type { TriedClaim } from '../../core/drafts/claim-draft';
import { Session } from '../../core/session/session';
import { JobServer } from '../../testing/job-server';
import { sendClaim } from './send-claim';
import type { ClaimBody } from './typed-claim';

const BODY: ClaimBody = {
  jobRef: '0417',
  madeOn: '2026-02-02',
  zone: 'floor',
  side: 'left',
  cause: 'thin_coverage',
  decision: 'open',
  labourMinutes: 45,
  productMl: 0,
};
const REF = 'W-2026-02-02';
const held = (ref: string) => `claim HAV/${ref}`;

/** A device that sends a claim to a server, remembering what it tried as the page does. */
function device(server: JobServer) {
  TestBed.configureTestingModule({
    providers: [
      provideHttpClient(withInterceptors([server.interceptor])),
      { provide: Session, useValue: { usableToken: async () => 'one' } },
    ],
  });
  const api = TestBed.inject(Api);
  let tried: TriedClaim | undefined;
  return {
    tried: () => tried,
    send: (body: ClaimBody = BODY, claimRef = REF) =>
      sendClaim(api, { branch: 'HAV', claimRef, body, tried }, async (now) => (tried = now)),
  };
}

describe('sendClaim', () => {
  it('given a free reference, records the claim under it', async () => {
    const server = new JobServer();
    expect(await device(server).send()).toEqual({ kind: 'recorded', claimRef: REF });
    expect(server.jobs.get(held(REF))?.body).toEqual(BODY);
  });

  it("given another's claim under the reference proposed, takes the next", async () => {
    const server = new JobServer();
    server.jobs.set(held(REF), { revision: 1, body: { ...BODY, jobRef: '0300' } });
    const next = `${REF}-2`;
    expect(await device(server).send()).toEqual({ kind: 'recorded', claimRef: next });
    expect(server.jobs.get(held(REF))?.body).toMatchObject({ jobRef: '0300' });
    expect(server.jobs.get(held(next))?.body).toEqual(BODY);
  });

  it("given another's claim under a reference somebody wrote, asks for another", async () => {
    const server = new JobServer();
    server.jobs.set(held('C-7'), { revision: 1, body: { ...BODY, jobRef: '0300' } });
    const sent = await device(server).send(BODY, 'C-7');
    expect(sent).toMatchObject({
      kind: 'refused',
      problem: { fields: [{ path: '/claimRef' }] },
    });
  });

  it('given an answer lost, sent again, is one claim', async () => {
    const server = new JobServer();
    const phone = device(server);
    server.line = 'answer lost';
    expect((await phone.send()).kind).toBe('unanswered');
    server.line = 'up';
    expect(await phone.send()).toEqual({ kind: 'recorded', claimRef: REF });
    expect(server.jobs.size).toBe(1);
    expect(server.jobs.get(held(REF))?.revision).toBe(1);
  });

  it('given an answer lost and the claim written on, sent again, corrects the one that arrived', async () => {
    const server = new JobServer();
    const phone = device(server);
    server.line = 'answer lost';
    await phone.send();
    server.line = 'up';
    const more = { ...BODY, labourMinutes: 90 };
    expect(await phone.send(more)).toEqual({ kind: 'recorded', claimRef: REF });
    expect(server.jobs.size).toBe(1);
    expect(server.jobs.get(held(REF))).toEqual({ revision: 2, body: more });
  });

  it('given an answer lost and the claim decided by somebody since, sends no second one', async () => {
    const server = new JobServer();
    const phone = device(server);
    server.line = 'answer lost';
    await phone.send();
    server.line = 'up';
    server.jobs.set(held(REF), { revision: 2, body: { ...BODY, decision: 'accepted' } });
    const sent = await phone.send();
    expect(sent).toMatchObject({ kind: 'refused', problem: { status: 409 } });
    expect(server.jobs.size).toBe(1);
  });

  it('given no line, records nothing and remembers what it tried', async () => {
    const server = new JobServer();
    const phone = device(server);
    server.line = 'down';
    expect((await phone.send()).kind).toBe('unanswered');
    expect(phone.tried()).toEqual({ claimRef: REF, bodies: [JSON.stringify(BODY)] });
  });

  it('given a refusal, tells it and remembers nothing as tried', async () => {
    const server = new JobServer();
    const phone = device(server);
    const problems = [{ path: '/madeOn', message: 'is before completedOn' }];
    server.line = { status: 422, body: { detail: 'Not so', problems } };
    expect(await phone.send()).toMatchObject({ kind: 'refused', problem: { fields: problems } });
    expect(phone.tried()).toBeUndefined();
  });
});
