import { TARGET_MEASURES } from '#shared/domain/target-measures';
import type { Role } from '#shared/domain/vocabulary';
import { openPage } from '../../testing/open-page';
import { TargetsPage } from './targets-page';

const PUT = '/api/branches/HAV/targets/overrun';

function answerOf(own: number | null = null, network: number | null = 0.35) {
  return {
    network: TARGET_MEASURES.map((measure) => ({
      measure,
      value: measure === 'margin' ? network : null,
    })),
    branches: TARGET_MEASURES.map((measure) => ({
      branch: 'HAV',
      measure,
      own: measure === 'overrun' ? own : null,
      holds: measure === 'overrun' ? own : measure === 'margin' ? network : null,
    })),
  };
}

async function open(role: Role) {
  const { http, settle, host } = await openPage(TargetsPage, {
    url: '/targets',
    role,
    catalogue: { branchName: () => 'Havnsund', state: { reload: () => undefined } },
  });
  http.expectOne('/api/targets').flush(answerOf());
  await settle();
  const cell = (name: string): HTMLButtonElement | null =>
    host.querySelector(`button[aria-label$="${name}"]`);
  const type = async (text: string): Promise<void> => {
    const field = host.querySelector<HTMLInputElement>('[name=value]')!;
    field.value = text;
    field.dispatchEvent(new Event('input'));
    await settle();
  };
  const submit = async (): Promise<void> => {
    host.querySelector('form')!.dispatchEvent(new Event('submit', { cancelable: true }));
    await settle();
  };
  const press = async (button: HTMLButtonElement | null): Promise<void> => {
    button!.click();
    await settle();
  };
  return { http, host, settle, cell, type, submit, press };
}
const textOf = (host: HTMLElement): string => host.textContent.replaceAll('\u202f', ' ');

describe('TargetsPage', () => {
  beforeEach(() => sessionStorage.clear());

  it('opened, says what the network wants, whose it is in a branch, and that targets move no limit', async () => {
    const { host } = await open('head_office');
    expect(host.querySelector('h1')?.textContent).toContain(
      '1 of 4 figures has a target for the network; every branch follows it.',
    );
    expect(textOf(host)).toContain('35 %the network’s');
    expect(textOf(host)).toContain('never moves them');
  });

  it('to a lead, the network’s are read alone, a branch’s can be set', async () => {
    const { cell } = await open('regional_lead');
    expect(cell('Margin target of the network')).toBeNull();
    expect(cell('Margin target of Havnsund')).not.toBeNull();
  });

  it('set for a branch, goes in the unit of the API, is said, and read anew', async () => {
    const { http, host, cell, type, submit, press, settle } = await open('regional_lead');
    await press(cell('Overrun target of Havnsund'));
    await type('7,5');
    await submit();
    const request = http.expectOne({ method: 'PUT', url: PUT });
    expect(request.request.body).toEqual({ value: 1.075 });
    request.flush({ branch: 'HAV', measure: 'overrun', own: 1.075, holds: 1.075 });
    await settle();
    http.expectOne('/api/targets').flush(answerOf(1.075));
    await settle();
    expect(host.querySelector('.us-done')?.textContent).toContain(
      'Overrun target of Havnsund: set.',
    );
    expect(textOf(host)).toContain('+7.5 %');
    expect(sessionStorage).toHaveLength(0);
  });

  it('taken away by head office from the network, sends null', async () => {
    const { http, host, cell, press } = await open('head_office');
    await press(cell('Margin target of the network'));
    const away = [...host.querySelectorAll('button')].find((one) =>
      one.textContent.includes('Take it away'),
    )!;
    await press(away);
    expect(http.expectOne('/api/targets/margin').request.body).toEqual({ value: null });
  });

  it('no number typed, says how to write it and sends nothing', async () => {
    const { http, host, cell, type, submit, press } = await open('head_office');
    await press(cell('Margin target of Havnsund'));
    await type('a third');
    await submit();
    http.expectNone('/api/branches/HAV/targets/margin');
    expect(host.querySelector('[role=alert]')?.textContent).toContain('Write it as 35 or 35.5');
  });

  it.each([422, 409, 0])('refused with %d, keeps what was typed', async (status) => {
    const { http, host, cell, type, submit, press, settle } = await open('regional_lead');
    await press(cell('Overrun target of Havnsund'));
    await type('7.5');
    await submit();
    const request = http.expectOne({ method: 'PUT', url: PUT });
    if (status === 0) request.error(new ProgressEvent('error'));
    else {
      const problems = [{ path: '/value', message: 'at most 1000' }];
      request.flush({ problems, detail: 'Changed' }, { status, statusText: 'no' });
    }
    await settle();
    expect(host.querySelector<HTMLInputElement>('[name=value]')?.value).toBe('7.5');
    expect(host.querySelector('[role=alert]')?.textContent?.trim()).not.toBe('');
  });
});
