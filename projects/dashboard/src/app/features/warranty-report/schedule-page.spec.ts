import { signal } from '@angular/core';
import { openPage } from '../../testing/open-page';
import { warrantySchedule } from '../../testing/warranty-report-answers';
import { SchedulePage } from './schedule-page';

jest.setTimeout(30_000);

const PEOPLE = {
  items: [
    { id: 4, name: 'Runa Estvik', email: 'office@underseam.example', role: 'head_office' },
    { id: 5, name: 'Ilse Torven', email: 'manager@underseam.example', role: 'site_manager' },
  ].map((person) => ({
    ...person,
    regions: [],
    branches: [],
    active: true,
    invited: false,
    lastSignInAt: null,
  })),
};

async function open(schedule = warrantySchedule({ people: [] })) {
  const page = await openPage(SchedulePage, {
    url: '/warranty/reports/schedule',
    catalogue: { currency: signal('EUR') },
  });
  const answer = async (now: object): Promise<void> => {
    page.http.expectOne('/api/warranty-schedule').flush(now);
    page.http.expectOne('/api/people').flush(PEOPLE);
    await page.settle();
    await page.settle();
  };
  await answer(schedule);
  const { host, http, settle } = page;
  const type = async (day: string): Promise<void> => {
    const field = host.querySelector<HTMLInputElement>('input[formcontrolname=dayOfMonth]')!;
    field.value = day;
    field.dispatchEvent(new Event('input'));
    await settle();
  };
  const save = async (): Promise<void> => {
    host.querySelector<HTMLButtonElement>('button[type=submit]')!.click();
    await settle();
  };
  const put = () => http.expectOne({ method: 'PUT', url: '/api/warranty-schedule' });
  const day = () => host.querySelector<HTMLInputElement>('input[formcontrolname=dayOfMonth]')!;
  return { ...page, answer, type, save, put, day };
}

describe('SchedulePage', () => {
  it('opened, offers people of head office and says when it is due', async () => {
    const { host } = await open();
    expect(host.querySelector('fieldset')?.textContent).toContain('Runa Estvik');
    expect(host.querySelector('fieldset')?.textContent).not.toContain('Ilse Torven');
    expect(host.textContent).toContain('Due next on');
  });

  it('a person ticked and a day typed, keeps both and says what holds now', async () => {
    const { host, type, save, put, settle, answer } = await open();
    host.querySelector<HTMLInputElement>('fieldset input[type=checkbox]')!.click();
    await type('15');
    await save();
    const call = put();
    expect(call.request.body).toEqual({ active: true, dayOfMonth: 15, people: [4] });
    const kept = warrantySchedule({ dayOfMonth: 15, nextOn: '2026-02-15' });
    call.flush(kept);
    await settle();
    await answer(kept);
    expect(host.querySelector('.us-done')?.textContent).toContain('Saved. Issued on the 15th');
  });

  it('a day that not every month has, is told at its field and not sent', async () => {
    const { host, http, type, save, day } = await open();
    await type('31');
    await save();
    http.expectNone({ method: 'PUT', url: '/api/warranty-schedule' });
    expect(host.querySelector('mat-error')?.textContent).toContain('A day from 1 to 28');
    expect(day().value).toBe('31');
  });

  it('refused for a person, says so at the people and keeps what was typed', async () => {
    const { host, type, save, put, settle, day } = await open();
    await type('9');
    await save();
    put().flush(
      { problems: [{ path: '/people/0', message: 'not an active person of head office' }] },
      { status: 422, statusText: 'Unprocessable' },
    );
    await settle();
    expect(host.querySelector('fieldset [role=alert]')?.textContent).toContain(
      'not an active person of head office',
    );
    expect(day().value).toBe('9');
  });

  it('after a run, tells how each mail stands', async () => {
    const { host } = await open(
      warrantySchedule({
        lastRun: { month: '2026-02', at: '2026-02-01T06:00:00Z', report: 4, mails: 1 },
        mails: [
          {
            to: 'office@underseam.example',
            state: 'kept_here',
            attempts: 0,
            sentAt: null,
            lastError: null,
          },
        ],
      }),
    );
    expect(host.textContent).toContain('kept in the mailbox here');
    expect(host.querySelector('a[href="/warranty/reports/4"]')).not.toBeNull();
    expect(host.querySelector('a[href="/mailbox"]')).not.toBeNull();
  });
});
