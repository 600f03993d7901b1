import { signal } from '@angular/core';
import { actionOf } from '../../testing/action-answers';
import { openPage } from '../../testing/open-page';
import { signalOf } from '../../testing/signal-answers';
import { AgreePage } from './agree-page';

const POST = { method: 'POST', url: '/api/branches/HAV/actions' };

async function open(inputs: Record<string, string> = {}) {
  const { http, settle, host, fixture } = await openPage(AgreePage, {
    url: '/actions/new',
    role: 'regional_lead',
    catalogue: {
      branches: signal([
        { code: 'HAV', name: 'Havnsund', region: 'SOUND', closedOn: null },
        { code: 'TAN', name: 'Tangvarp', region: 'SOUND', closedOn: null },
        { code: 'OLD', name: 'Oldvik', region: 'SOUND', closedOn: '2024-01-01' },
      ]),
      branchName: (code: string) => code,
      state: {
        value: signal({}),
        loading: signal(false),
        refreshing: signal(false),
        problem: signal(undefined),
        reload: () => undefined,
      },
    },
    inputs,
  });
  if (inputs['signal']) {
    http.expectOne('/api/branches/HAV/signals/7').flush({ ...signalOf(7), listed: [] });
    await settle();
  }
  const field = (name: string) =>
    host.querySelector<HTMLInputElement>(`[formControlName=${name}]`)!;
  const type = async (name: string, text: string, event = 'input'): Promise<void> => {
    field(name).value = text;
    field(name).dispatchEvent(new Event(event, { bubbles: true }));
    await settle();
  };
  const submit = async (): Promise<void> => {
    host.querySelector('form')!.dispatchEvent(new Event('submit', { cancelable: true }));
    await settle();
  };
  return { http, host, settle, field, type, submit, fixture };
}

describe('AgreePage', () => {
  beforeEach(() => sessionStorage.clear());

  it('from a signal, is filled with its branch and measure, tells it, and sends it along', async () => {
    const { http, host, field, type, submit, settle } = await open({
      branch: 'HAV',
      measure: 'overrun',
      signal: '7',
    });
    expect(host.textContent).toContain('About the signal: Cars wait for their bill');
    expect(field('branch').value).toBe('HAV');
    expect(field('measure').value).toBe('overrun');
    expect(field('until').value).toBe('2026-03-02');
    await type('what', 'Clips before refit');
    await type('who', 'Ilse');
    await submit();
    const request = http.expectOne(POST);
    expect(request.request.body).toEqual({
      what: 'Clips before refit',
      who: 'Ilse',
      until: '2026-03-02',
      measure: 'overrun',
      signal: 7,
    });
    request.flush(actionOf(3), { status: 201, statusText: 'Created' });
    await settle();
    expect(sessionStorage).toHaveLength(0);
  });

  it('offers the branches that are open', async () => {
    const { host } = await open();
    const codes = [...host.querySelectorAll('[formControlName=branch] option')].map(
      (one) => (one as HTMLOptionElement).value,
    );
    expect(codes).toEqual(['', 'HAV', 'TAN']);
  });

  it('left out, each missing field says what it takes, and nothing is sent', async () => {
    const { http, host, submit } = await open();
    await submit();
    http.expectNone(POST);
    const errors = [...host.querySelectorAll('mat-error')].map((one) => one.textContent.trim());
    expect(errors).toHaveLength(3);
    expect(errors[0]).toContain('Choose the branch.');
  });

  it('refused, says it at the field and keeps everything; sent again after a change', async () => {
    const { http, host, field, type, submit, settle } = await open({ branch: 'HAV' });
    await type('what', 'Clips before refit');
    await type('who', 'Ilse');
    await type('until', '2026-02-01');
    await submit();
    http
      .expectOne(POST)
      .flush(
        { problems: [{ path: '/until', message: 'must not lie in the past' }] },
        { status: 422, statusText: 'no' },
      );
    await settle();
    expect(host.querySelector('mat-error')?.textContent).toContain('must not lie in the past');
    expect(field('what').value).toBe('Clips before refit');
    await type('until', '2026-02-20');
    await submit();
    http.expectOne(POST);
  });

  it('the line breaks, what was typed is there when the form is opened again', async () => {
    const first = await open({ branch: 'HAV' });
    await first.type('what', 'Clips before refit');
    await first.type('who', 'Ilse');
    await first.submit();
    first.http.expectOne(POST).error(new ProgressEvent('error'));
    await first.settle();
    expect(first.host.querySelector('[role=alert]')?.textContent).toContain('kept here');
    first.fixture.destroy();
    const { TestBed } = await import('@angular/core/testing');
    TestBed.resetTestingModule();
    const again = await open({ branch: 'HAV' });
    expect(again.field('what').value).toBe('Clips before refit');
    expect(again.field('who').value).toBe('Ilse');
  });
});
