import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { CUSTOM_ELEMENTS_SCHEMA, signal, type Type } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { provideRouter, Router } from '@angular/router';
import type { Role } from '#shared/domain/vocabulary';
import { Catalogue } from '../core/catalogue/catalogue';
import { ScopeLine } from '../core/scope-line/scope-line';
import { Session } from '../core/session/session';

/** How a page is opened in a spec. */
export interface Opening {
  readonly url: string;
  /** What the page takes from the catalogue, besides that today is 2 February 2026. */
  readonly catalogue: Readonly<Record<string, unknown>>;
  readonly inputs?: Readonly<Record<string, unknown>>;
  readonly role?: Role;
}

/** Opens a page at its address, without the scope line; `settle` waits until what was answered is shown. */
export async function openPage<Page>(
  page: Type<Page>,
  { url, catalogue, inputs = {}, role }: Opening,
) {
  const session = { role: signal(role), person: signal(undefined) };
  TestBed.configureTestingModule({
    providers: [
      provideHttpClient(),
      provideHttpClientTesting(),
      provideRouter([{ path: '**', children: [] }]),
      ...(role ? [{ provide: Session, useValue: session }] : []),
      {
        provide: Catalogue,
        useValue: { today: signal('2026-02-02'), value: signal(undefined), ...catalogue },
      },
    ],
  }).overrideComponent(page, {
    remove: { imports: [ScopeLine] },
    add: { schemas: [CUSTOM_ELEMENTS_SCHEMA] },
  });
  await TestBed.inject(Router).navigateByUrl(url);
  const http = TestBed.inject(HttpTestingController);
  const fixture = TestBed.createComponent(page);
  for (const [name, value] of Object.entries(inputs)) fixture.componentRef.setInput(name, value);
  const settle = async (): Promise<void> => {
    await new Promise((done) => setTimeout(done));
    fixture.detectChanges();
  };
  fixture.detectChanges();
  await settle();
  return { http, fixture, settle, host: fixture.nativeElement as HTMLElement };
}
