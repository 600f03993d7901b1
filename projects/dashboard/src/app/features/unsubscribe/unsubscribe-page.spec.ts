import { openPage } from '../../testing/open-page';
import { UnsubscribePage } from './unsubscribe-page';

const PATH = '/api/mail/unsubscribe?token=a.b.c';

async function open(token: string | undefined = 'a.b.c') {
  const { http, settle, host } = await openPage(UnsubscribePage, {
    url: '/unsubscribe',
    catalogue: {},
    inputs: { token },
  });
  const tell = async (wanted: boolean) => {
    http.expectOne({ method: 'GET', url: PATH }).flush({ kind: 'monday_digest', wanted });
    await settle();
  };
  const press = async () => {
    host.querySelector('button')!.click();
    await settle();
    return http.expectOne({ method: 'POST', url: PATH });
  };
  return { http, settle, host, tell, press };
}

describe('UnsubscribePage', () => {
  it('opened, changes nothing, says which mail it is and what still comes', async () => {
    const { http, host, tell } = await open();
    expect(host.textContent).toContain('Loading');
    await tell(true);
    http.verify();
    expect(host.textContent).toContain('“Monday: your week in three sentences”');
    expect(host.textContent).toContain('Every other mail you receive still comes');
    expect(host.querySelectorAll('button')).toHaveLength(1);
  });

  it('the button pressed, stops it and says where to have it again', async () => {
    const { host, settle, tell, press } = await open();
    await tell(true);
    (await press()).flush({ kind: 'monday_digest', wanted: false });
    await settle();
    expect(host.querySelector('[role=status]')?.textContent).toContain('no longer comes');
    expect(host.querySelector('a[href="/account"]')).not.toBeNull();
    expect(host.querySelector('button')).toBeNull();
  });

  it('stopping refused, says that the mail still comes and lets it be tried again', async () => {
    const { host, settle, tell, press } = await open();
    await tell(true);
    (await press()).flush({}, { status: 500, statusText: 'Server error' });
    await settle();
    expect(host.querySelector('[role=alert]')?.textContent).toContain('still comes');
    expect(host.querySelector('button')).not.toBeNull();
  });

  it('stopped before, says so and offers nothing to press', async () => {
    const { host, tell } = await open();
    await tell(false);
    expect(host.textContent).toContain('is stopped already');
    expect(host.querySelector('button')).toBeNull();
  });

  it('given a link that is not known, says what to do and that nothing was changed', async () => {
    const { http, host, settle } = await open();
    http.expectOne(PATH).flush({}, { status: 404, statusText: 'Not found' });
    await settle();
    expect(host.textContent).toContain('Nothing was changed');
    expect(host.querySelector('a[href="/account"]')).not.toBeNull();
  });

  it('given no token, asks nothing and says so', async () => {
    const { http, host } = await open('');
    http.verify();
    expect(host.textContent).toContain('This link is not whole');
  });
});
