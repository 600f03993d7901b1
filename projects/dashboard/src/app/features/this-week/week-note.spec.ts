import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { TestBed } from '@angular/core/testing';
import { provideRouter } from '@angular/router';
import { WeekNote } from './week-note';
import type { WeekWords } from './week-words';

const words: WeekWords = {
  currency: 'EUR',
  today: '2026-02-02',
  branchName: (code) => `Branch ${code}`,
  packageName: (code) => code,
  productName: (code) => code,
  whose: '',
};
const note = {
  branch: 'HAV',
  week: '2026-W05',
  text: 'Two sills opened up.',
  by: 'Ilse Torven',
  changedAt: '2026-02-02T07:10:00Z',
};

async function show(
  items: readonly object[],
  more: { branches?: string[]; mayWrite?: boolean } = {},
) {
  TestBed.configureTestingModule({
    providers: [provideHttpClient(), provideHttpClientTesting(), provideRouter([])],
  });
  const http = TestBed.inject(HttpTestingController);
  const fixture = TestBed.createComponent(WeekNote);
  fixture.componentRef.setInput('week', '2026-W05');
  fixture.componentRef.setInput('branches', more.branches ?? ['HAV']);
  fixture.componentRef.setInput('words', words);
  fixture.componentRef.setInput('mayWrite', more.mayWrite ?? true);
  const settle = async (): Promise<void> => {
    await new Promise((done) => setTimeout(done));
    fixture.detectChanges();
  };
  fixture.detectChanges();
  await settle();
  http.expectOne((request) => request.url.startsWith('/api/week-notes?')).flush({ items });
  await settle();
  const host = fixture.nativeElement as HTMLElement;
  const press = async (name: string): Promise<void> => {
    const buttons = [...host.querySelectorAll('button')];
    buttons.find((button) => button.textContent.trim() === name)!.click();
    await settle();
  };
  const write = async (text: string): Promise<void> => {
    const area = host.querySelector('textarea')!;
    area.value = text;
    area.dispatchEvent(new Event('input'));
    await settle();
  };
  return { http, host, press, write, settle, fixture };
}

describe('WeekNote', () => {
  beforeEach(() => sessionStorage.clear());

  it('a note: read with its author', async () => {
    const { host } = await show([note], { mayWrite: false });
    expect(host.querySelector('blockquote')?.textContent).toBe(note.text);
    expect(host.textContent).toContain('Ilse Torven');
    expect(host.querySelector('button')).toBeNull();
  });

  it('several branches: each note names its branch, none can be written', async () => {
    const { host } = await show([note], { branches: ['HAV', 'OST'] });
    expect(host.textContent).toContain('Branch HAV');
    expect(host.querySelector('button')).toBeNull();
    expect(host.textContent).toContain('choose one branch');
  });

  it('kept: sent for the week of the branch, then read again', async () => {
    const { http, host, press, write, settle } = await show([]);
    await press('Leave a note');
    await write('The welder was off.');
    await press('Keep the note');
    const put = http.expectOne('/api/branches/HAV/weeks/2026-W05/note');
    expect(put.request.body).toEqual({ text: 'The welder was off.' });
    put.flush({ note: { ...note, text: 'The welder was off.' } });
    await settle();
    http
      .expectOne((request) => request.url.startsWith('/api/week-notes?'))
      .flush({ items: [{ ...note, text: 'The welder was off.' }] });
    await settle();
    expect(host.querySelector('textarea')).toBeNull();
    expect(host.querySelector('blockquote')?.textContent).toBe('The welder was off.');
  });

  it('the line breaks while it is sent: the text stays in the form and says so', async () => {
    const { http, host, press, write, settle } = await show([]);
    await press('Leave a note');
    await write('The welder was off.');
    await press('Keep the note');
    http.expectOne('/api/branches/HAV/weeks/2026-W05/note').error(new ProgressEvent('error'));
    await settle();
    expect(host.querySelector('textarea')?.value).toBe('The welder was off.');
    expect(host.querySelector('[role=alert]')?.textContent).toContain(
      'What you wrote is kept here.',
    );
  });

  it('the page is opened again before saving: the draft is there', async () => {
    const first = await show([]);
    await first.press('Leave a note');
    await first.write('The welder');
    first.fixture.destroy();
    TestBed.resetTestingModule();
    const { host } = await show([]);
    expect(host.querySelector('textarea')?.value).toBe('The welder');
  });

  it('thrown away: the draft is gone, the note as it was', async () => {
    const { host, press, write } = await show([note]);
    await press('Change the note');
    expect(host.querySelector('textarea')?.value).toBe(note.text);
    await write('something else');
    await press('Throw the draft away');
    expect(host.querySelector('blockquote')?.textContent).toBe(note.text);
    expect(sessionStorage.length).toBe(0);
  });
});
