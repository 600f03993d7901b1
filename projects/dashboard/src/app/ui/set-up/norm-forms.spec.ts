import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { signal } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import type { BodyType } from '#shared/domain/vocabulary';
import { Catalogue } from '../../core/catalogue/catalogue';
import { NormForms } from './norm-forms';

const SOLD = { code: 'full', name: 'Full', warrantyMonths: 72 };

async function open() {
  TestBed.configureTestingModule({
    providers: [
      provideHttpClient(),
      provideHttpClientTesting(),
      {
        provide: Catalogue,
        useValue: {
          currency: signal('EUR'),
          value: signal({ products: [{ code: 'CW1', name: 'Cavity wax' }] }),
          normsOf: () => [],
        },
      },
    ],
  });
  const http = TestBed.inject(HttpTestingController);
  const fixture = TestBed.createComponent(NormForms);
  fixture.componentRef.setInput('sold', SOLD);
  const host = fixture.nativeElement as HTMLElement;
  const settle = async (): Promise<void> => {
    await new Promise((done) => setTimeout(done));
    fixture.detectChanges();
  };
  const look = async (bodyType: BodyType): Promise<void> => {
    fixture.componentRef.setInput('bodyType', bodyType);
    fixture.detectChanges();
    await settle();
    await settle();
  };
  const seen = (): HTMLInputElement =>
    host.querySelector<HTMLInputElement>('us-norm-form:not([hidden]) input')!;
  const type = async (text: string): Promise<void> => {
    seen().value = text;
    seen().dispatchEvent(new Event('input'));
    await settle();
  };
  const told = (): string => host.querySelector('.unsaved')!.textContent.trim();
  return { http, host, look, seen, type, told };
}

describe('NormForms', () => {
  it('another body type looked at, what was typed for the first is told as not saved and stands there again', async () => {
    const { look, seen, type, told } = await open();
    await look('hatchback');
    await type('3500');
    expect(told()).toBe('');
    await look('estate');
    expect(seen().value).toBe('');
    expect(told()).toBe('Typed and not saved yet: hatchback.');
    await look('hatchback');
    expect(seen().value).toBe('3500');
    expect(told()).toBe('');
  });

  it('nothing typed, another body type looked at, tells nothing and asks for each median once', async () => {
    const { http, look, told } = await open();
    await look('hatchback');
    await look('estate');
    await look('hatchback');
    expect(told()).toBe('');
    expect(http.match(({ url }) => url.includes('full'))).toHaveLength(2);
  });
});
