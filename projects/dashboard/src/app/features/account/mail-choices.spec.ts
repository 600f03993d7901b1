import { openPage } from '../../testing/open-page';
import { MailChoices } from './mail-choices';

const BOTH = {
  items: [
    { kind: 'new_sign_in', wanted: true },
    { kind: 'import_ended', wanted: false },
  ],
};

async function open(items: object = BOTH) {
  const { http, settle, host } = await openPage(MailChoices, { url: '/account', catalogue: {} });
  http.expectOne('/api/auth/mails').flush(items);
  await settle();
  const boxes = () => [...host.querySelectorAll<HTMLInputElement>('input[type=checkbox]')];
  const tick = async (index: number) => {
    boxes()[index]!.click();
    await settle();
    return http.expectOne({ method: 'PUT', url: '/api/auth/mails' });
  };
  return { host, settle, boxes, tick };
}

describe('MailChoices', () => {
  it('opened, shows a tick for each mail one may receive', async () => {
    const { boxes, host } = await open({ items: [{ kind: 'new_sign_in', wanted: true }] });
    expect(boxes().map((box) => box.checked)).toEqual([true]);
    expect(host.textContent).toContain('always come');
  });

  it('a mail ticked, keeps that one alone and says so', async () => {
    const { boxes, host, settle, tick } = await open();
    const request = await tick(1);
    expect(request.request.body).toEqual({ items: [{ kind: 'import_ended', wanted: true }] });
    request.flush({ items: BOTH.items.map((item) => ({ ...item, wanted: true })) });
    await settle();
    expect(boxes().map((box) => box.checked)).toEqual([true, true]);
    expect(host.querySelector('[role=status]')?.textContent).toContain('comes');
  });

  it('keeping refused, goes back to what is kept and says that nothing changed', async () => {
    const { boxes, host, settle, tick } = await open();
    (await tick(0)).flush({}, { status: 500, statusText: 'Server error' });
    await settle();
    expect(boxes()[0]!.checked).toBe(true);
    expect(host.querySelector('[role=alert]')?.textContent).toContain('Nothing was changed');
  });
});
