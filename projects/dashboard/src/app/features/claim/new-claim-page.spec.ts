import { provideHttpClient, withInterceptors } from '@angular/common/http';
import { signal } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { provideRouter, Router } from '@angular/router';
import type { Role } from '#shared/domain/vocabulary';
import { Catalogue } from '../../core/catalogue/catalogue';
import { ClaimDrafts } from '../../core/drafts/claim-drafts';
import { Session } from '../../core/session/session';
import { newDevice, photoFile } from '../../testing/device';
import { JobServer } from '../../testing/job-server';
import { FIELD_DEFAULTS } from '../../ui/field-defaults';
import { NewClaimPage } from './new-claim-page';
import { emptyClaim } from './typed-claim';

const JOB = {
  vehicle: { make: 'Velder', model: 'Tessock', bodyType: 'hatchback', firstRegistered: '2009-05' },
  package: 'full',
  completedOn: '2025-03-03',
  warrantyMonths: 36,
};
const REF = 'W-2026-02-02';
const HELD = `claim HAV/${REF}`;

/** The page on job 0417 of a server that has it, opened by a person of a role on one device. */
async function open(server: JobServer, role: Role = 'recorder') {
  server.jobs.set('HAV/0417', { revision: 1, body: JOB });
  TestBed.resetTestingModule();
  TestBed.configureTestingModule({
    providers: [
      provideHttpClient(withInterceptors([server.interceptor])),
      provideRouter([{ path: '**', children: [] }]),
      FIELD_DEFAULTS,
      {
        provide: Session,
        useValue: {
          role: signal(role),
          person: signal({ id: 7 }),
          usableToken: () => Promise.resolve('one'),
        },
      },
      {
        provide: Catalogue,
        useValue: {
          today: signal('2026-02-02'),
          currency: signal('EUR'),
          value: signal({ network: { claimLimitCents: 60_000 } }),
          packageName: (code: string) => code,
        },
      },
    ],
  });
  const fixture = TestBed.createComponent(NewClaimPage);
  fixture.componentRef.setInput('branch', 'HAV');
  fixture.componentRef.setInput('jobRef', '0417');
  const host = fixture.nativeElement as HTMLElement;
  const until = async (said: () => unknown): Promise<void> => {
    for (let tries = 0; !said() && tries < 200; tries += 1) {
      await new Promise((resolve) => setTimeout(resolve, 10));
      fixture.detectChanges();
    }
    expect(Boolean(said())).toBe(true);
  };
  await until(() => host.querySelector('us-claim-fields, .sent'));
  const field = (name: string): HTMLInputElement =>
    host.querySelector<HTMLInputElement>(`[formcontrolname="${name}"]`)!;
  const type = (name: string, text: string): void => {
    field(name).value = text;
    field(name).dispatchEvent(new Event('input'));
    fixture.detectChanges();
  };
  const choose = (value: string): void => {
    host.querySelector<HTMLInputElement>(`input[type=radio][value="${value}"]`)!.click();
    fixture.detectChanges();
  };
  const press = (words: RegExp): void => {
    const buttons = [...host.querySelectorAll('button')];
    buttons.find((button) => words.test(button.textContent))!.click();
    fixture.detectChanges();
  };
  const onTheFloor = (): void => {
    press(/^\s*As a list/);
    [...host.querySelectorAll<HTMLInputElement>('us-underside-pick-list input')]
      .find((input) => input.getAttribute('aria-label') === 'floor, left')!
      .click();
    fixture.detectChanges();
  };
  return { host, until, field, type, choose, press, onTheFloor };
}

const record = /^\s*Record the claim/;

describe('NewClaimPage', () => {
  beforeEach(() => {
    newDevice();
    // What jsdom lacks.
    URL.createObjectURL = () => 'blob:here';
    URL.revokeObjectURL = () => undefined;
  });

  it('sent empty: names what is missing at its field and sends nothing', async () => {
    const server = new JobServer();
    const { host, until, press } = await open(server);
    press(record);
    await until(() => host.textContent.includes('Touch the car where it is'));
    expect(host.textContent).toContain('Choose why; it can be corrected later.');
    expect(server.heard.filter(({ call }) => call.startsWith('PUT'))).toEqual([]);
  });

  it('for a recorder: asks for no money and no decision, and says who decides', async () => {
    const { host, field } = await open(new JobServer());
    expect(field('cost')).toBeNull();
    expect(host.querySelectorAll('us-explained-choice')).toHaveLength(1);
    expect(host.textContent).toContain('Your site manager decides it.');
  });

  it('for a manager above the limit: says before it is sent that head office decides', async () => {
    const { host, type, choose } = await open(new JobServer(), 'site_manager');
    expect(host.textContent).toContain('Up to €600.00 the branch decides');
    type('cost', '600.01');
    choose('accepted');
    expect(host.textContent).toContain('waits as your proposal');
  });

  it('filled in: records the claim, takes it off the device and goes to it', async () => {
    const server = new JobServer();
    const { until, choose, press, onTheFloor } = await open(server);
    onTheFloor();
    choose('thin_coverage');
    press(record);
    const router = TestBed.inject(Router);
    await until(() => router.url === `/claims/HAV/${REF}`);
    expect(server.jobs.get(HELD)?.body).toMatchObject({
      jobRef: '0417',
      zone: 'floor',
      side: 'left',
      cause: 'thin_coverage',
      decision: 'open',
    });
    const drafts = TestBed.inject(ClaimDrafts);
    expect(await drafts.find({ branch: 'HAV', jobRef: '0417' })).toBeUndefined();
  });

  it('without a line: keeps everything on the device, says so, and after a reload sends one claim', async () => {
    const server = new JobServer();
    const first = await open(server);
    first.onTheFloor();
    first.choose('damage');
    first.type('labourMinutes', '45');
    server.line = 'answer lost';
    first.press(record);
    await first.until(() => first.host.textContent.includes('No answer from the server'));
    expect(first.host.textContent).toContain('Kept on this device until it is sent');
    server.line = 'up';
    const again = await open(server);
    expect(again.field('labourMinutes').value).toBe('45');
    expect(again.field('claimRef').readOnly).toBe(true);
    again.press(record);
    await again.until(() => TestBed.inject(Router).url.startsWith('/claims/'));
    expect([...server.jobs.keys()].filter((key) => key.startsWith('claim'))).toEqual([HELD]);
  });

  it('refused by the server: marks the field and keeps what was typed', async () => {
    const server = new JobServer();
    const { host, until, field, type, choose, press, onTheFloor } = await open(server);
    onTheFloor();
    choose('damage');
    type('madeOn', '2025-01-01');
    const problems = [{ path: '/madeOn', message: 'is before completedOn (2025-03-03)' }];
    server.line = { status: 422, body: { detail: 'Some of this cannot be taken', problems } };
    press(record);
    await until(() =>
      host.textContent.includes(
        'The day it was made is before the day the job was finished (2025-03-03).',
      ),
    );
    expect(field('madeOn').value).toBe('2025-01-01');
  });

  it('with a photo that did not go: says that the claim is recorded, keeps the photo and sends it again', async () => {
    const server = new JobServer();
    await open(server);
    const drafts = TestBed.inject(ClaimDrafts);
    const job = { branch: 'HAV', jobRef: '0417' };
    await drafts.addPhoto(job, emptyClaim('2026-02-02'), photoFile());
    await drafts.change(job, { sentAs: REF });
    server.jobs.set(HELD, { revision: 1, body: {} });
    const { host, until, press } = await open(server);
    expect(host.textContent).toContain('1 photo has not gone yet');
    server.line = 'down';
    press(/Send the photos/);
    await until(() => host.textContent.includes('No answer from the server'));
    server.line = 'up';
    press(/Send the photos/);
    await until(() => TestBed.inject(Router).url === `/claims/HAV/${REF}`);
    expect(server.photos.size).toBe(1);
  });
});
