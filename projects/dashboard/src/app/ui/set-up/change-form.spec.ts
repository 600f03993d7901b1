import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { signal } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { Api } from '../../core/api/api';
import { Catalogue } from '../../core/catalogue/catalogue';
import { rateChange } from './branch-changes';
import { ChangeForm } from './change-form';
import { addPersonChange } from './person-changes';
import { productChange } from './product-changes';
import type { ChangeOf } from './change-of';

const EFFECT = '/api/set-up/effect';
const RATE = '/api/branches/HAV/rates/2026-02-02';

async function open<Out>(of: (api: Api) => ChangeOf<Out>) {
  TestBed.configureTestingModule({
    providers: [
      provideHttpClient(),
      provideHttpClientTesting(),
      { provide: Catalogue, useValue: { currency: signal('EUR') } },
    ],
  });
  const http = TestBed.inject(HttpTestingController);
  const fixture = TestBed.createComponent<ChangeForm<Out>>(ChangeForm);
  fixture.componentRef.setInput('of', of(TestBed.inject(Api)));
  const taken: Out[] = [];
  fixture.componentInstance.saved.subscribe((out) => taken.push(out));
  const host = fixture.nativeElement as HTMLElement;
  const settle = async (wait = 0): Promise<void> => {
    await new Promise((done) => setTimeout(done, wait));
    fixture.detectChanges();
    await new Promise((done) => setTimeout(done));
    fixture.detectChanges();
  };
  await settle();
  const input = (label: string): HTMLInputElement => {
    const found = [...host.querySelectorAll('mat-form-field')].find((one) =>
      one.querySelector('mat-label')?.textContent?.includes(label),
    );
    return found!.querySelector<HTMLInputElement>('input, select')!;
  };
  const type = (label: string, text: string): void => {
    input(label).value = text;
    input(label).dispatchEvent(new Event('input'));
    input(label).dispatchEvent(new Event('change'));
  };
  const send = async (): Promise<void> => {
    host.querySelector('form')!.dispatchEvent(new Event('submit'));
    await settle();
  };
  return { http, host, input, type, send, settle, taken };
}

const rest = 450;
const moved = {
  jobs: 12,
  branches: 1,
  from: '2026-02-02',
  to: '2026-02-20',
  marginCents: { before: 410_000, after: 400_000 },
  figures: ['margin'],
};

describe('ChangeForm', () => {
  afterEach(() => TestBed.inject(HttpTestingController).verify());

  it('a cost typed, tells what it moves before anything is saved, then saves and says what was done', async () => {
    const { http, host, type, send, settle, taken } = await open((api) =>
      rateChange(api, 'HAV', '2026-02-02'),
    );
    type('Cost of an hour', '52.50');
    await settle(rest);
    const asked = http.expectOne(EFFECT);
    expect(asked.request.body).toEqual({
      change: { kind: 'rate', branch: 'HAV', from: '2026-02-02', hourlyCostCents: 5_250 },
    });
    asked.flush(moved);
    await settle();
    expect(host.textContent).toContain('What they kept goes from €4,100 to €4,000.');
    await send();
    const saved = http.expectOne(RATE);
    expect(saved.request.body).toEqual({ hourlyCostCents: 5_250 });
    expect(host.textContent).toContain('Figures switch all at once');
    saved.flush({ from: '2026-02-02', restatedJobs: 12 });
    await settle();
    expect(taken).toEqual([{ from: '2026-02-02', restatedJobs: 12 }]);
    expect(host.textContent).toContain('Saved. 12 cars computed anew.');
    expect(host.textContent).not.toContain('What they kept');
  });

  it('sent faster than its effect is told, is not saved yet', async () => {
    const { http, host, type, send, settle } = await open((api) =>
      rateChange(api, 'HAV', '2026-02-02'),
    );
    type('Cost of an hour', '52');
    await send();
    http.expectNone(RATE);
    expect(host.textContent).toContain('Counting what it moves first.');
    await settle(rest);
    http.expectOne(EFFECT).flush(moved);
    await settle();
    expect(host.textContent).toContain('See what it moves, then press once more.');
    await send();
    http.expectOne(RATE).flush({ from: '2026-02-02', restatedJobs: 0 });
    await settle();
  });

  it('refused by the server, keeps what was typed and says why at the field', async () => {
    const { http, host, input, type, send, settle } = await open((api) =>
      rateChange(api, 'HAV', '2026-02-02'),
    );
    type('Cost of an hour', '52');
    await settle(rest);
    http.expectOne(EFFECT).flush(moved);
    await settle();
    await send();
    http.expectOne(RATE).flush(
      {
        ...{
          type: 'about:blank',
          title: 'No',
          status: 422,
          detail: 'Some of this cannot be taken',
        },
        problems: [{ path: '/hourlyCostCents', message: 'is more than anybody pays' }],
      },
      { status: 422, statusText: 'Unprocessable' },
    );
    await settle();
    expect(input('Cost of an hour').value).toBe('52');
    expect(host.querySelector('mat-error')?.textContent).toContain('is more than anybody pays');
    expect(host.textContent).toContain('What is typed here is kept.');
  });

  it('a code typed in small letters, is sent in capitals', async () => {
    const { http, input, type, send, settle } = await open((api) => productChange(api, []));
    type('Code', ' cw1');
    type('Name of the product', 'Cavity wax');
    type('Kind', 'cavity_wax');
    await send();
    http.expectOne({ method: 'PUT', url: '/api/products/CW1' }).flush({});
    await settle();
    expect(input('Code').value).not.toContain('cw1');
  });

  it('an amount that reads two ways, asks for nothing and says how to write it', async () => {
    const { host, type, send, settle } = await open((api) => rateChange(api, 'HAV', '2026-02-02'));
    type('Cost of an hour', '1,120');
    await settle(rest);
    await send();
    expect(host.textContent).toContain('Write the amount as 48 or 48.50.');
  });

  it('a person, by their role, is asked for branches or regions, and sends only what the role takes', async () => {
    const places = {
      regions: [{ code: 'SO', name: 'Sound' }],
      branches: [{ code: 'HAV', name: 'Havnsund' }],
    };
    const { http, host, type, send, settle } = await open((api) => addPersonChange(api, places));
    expect(host.querySelector('legend')?.textContent).toBe('Branches they see');
    type('Name', 'Tove Grindskar');
    type('E-mail', 'tove@network.example');
    type('Role', 'regional_lead');
    await settle();
    expect(host.querySelector('legend')?.textContent).toBe('Regions they see');
    await send();
    expect(host.querySelector('fieldset')?.textContent).toContain('Choose one.');
    host.querySelector<HTMLInputElement>('input[type=checkbox]')!.click();
    await send();
    const request = http.expectOne('/api/people');
    expect(request.request.body).toEqual({
      email: 'tove@network.example',
      name: 'Tove Grindskar',
      role: 'regional_lead',
      regions: ['SO'],
      branches: [],
    });
    request.flush({}, { status: 201, statusText: 'Created' });
    await settle();
  });
});
