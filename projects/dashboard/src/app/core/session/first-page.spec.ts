import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { Injector } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { firstPage } from './first-page';

async function ledTo(answer: object | undefined): Promise<string> {
  TestBed.configureTestingModule({ providers: [provideHttpClient(), provideHttpClientTesting()] });
  const led = firstPage(TestBed.inject(Injector));
  const request = TestBed.inject(HttpTestingController).expectOne('/api/catalogue');
  if (answer) request.flush(answer);
  else request.error(new ProgressEvent('error'));
  return led;
}

describe('firstPage', () => {
  it.each([
    [{ branches: [], packages: [{}] }, '/first-run'],
    [{ branches: [{}], packages: [] }, '/first-run'],
    [{ branches: [{}], packages: [{}] }, '/warranty'],
  ])('head office, with a catalogue of %j, is led to %s', async (catalogue, page) => {
    expect(await ledTo(catalogue)).toBe(page);
  });

  it('head office, where the catalogue does not answer, is led to where the page itself says so', async () => {
    expect(await ledTo(undefined)).toBe('/warranty');
  });
});
