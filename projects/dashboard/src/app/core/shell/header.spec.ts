import { signal } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { provideRouter, Router } from '@angular/router';
import type { Role } from '#shared/domain/vocabulary';
import { DangerousCount } from '../come-back/dangerous-count';
import { UnsentHere } from '../drafts/unsent-here';
import { Session } from '../session/session';
import { Header } from './header';

async function shownTo(role: Role, url = '/jobs', dangerous?: number, unsent = 0) {
  const person = { id: 1, email: 'a@b.test', name: 'Ilse Torven', role, regions: [], branches: [] };
  TestBed.configureTestingModule({
    providers: [
      provideRouter([{ path: '**', children: [] }]),
      { provide: Session, useValue: { person: signal(person), role: signal(role) } },
      {
        provide: UnsentHere,
        useValue: { mine: signal({ editing: 1, waiting: unsent }), count: () => undefined },
      },
      { provide: DangerousCount, useValue: { dangerous: signal(dangerous) } },
    ],
  });
  await TestBed.inject(Router).navigateByUrl(url);
  const fixture = TestBed.createComponent(Header);
  await fixture.whenStable();
  return fixture.nativeElement as HTMLElement;
}
const names = (element: HTMLElement) =>
  [...element.querySelectorAll('.wide a')].map((link) => link.textContent?.trim());

describe('Header', () => {
  it('to a recorder names Send a job first, Jobs and Quote', async () => {
    expect(names(await shownTo('recorder'))).toEqual(['Send a job', 'Jobs', 'Quote']);
  });

  it('to a site manager names the pages that exist, in their order', async () => {
    expect(names(await shownTo('site_manager'))).toEqual([
      'This week',
      'Overruns',
      'Rot',
      'Product',
      'Warranty',
      'Branches',
      'Signals',
      'Jobs',
      'Send a job',
      'Come-backs',
      'Quote',
    ]);
  });

  it('to head office names Warranty first', async () => {
    const shown = names(await shownTo('head_office'));
    expect(shown[0]).toBe('Warranty');
    expect(shown.filter((name) => name === 'Warranty')).toHaveLength(1);
  });

  it('on a job sheet marks Jobs as open, with the bead under it', async () => {
    const element = await shownTo('site_manager', '/jobs/HAV/0417');
    const open = element.querySelector('.wide [aria-current=page]');
    expect(open?.textContent?.trim()).toBe('Jobs');
    expect(open?.querySelector('us-bead')).not.toBeNull();
    expect(element.querySelectorAll('.wide us-bead')).toHaveLength(1);
  });

  it('given dangerous findings, says how many beside Come-backs, with the sign and a word', async () => {
    const element = await shownTo('site_manager', '/jobs', 9);
    const count = element.querySelector('.wide .count');
    expect(count?.textContent?.trim()).toBe('9 dangerous findings are still on cars');
    expect(count?.querySelector('svg')).not.toBeNull();
  });

  it('given none, shows no sign of danger', async () => {
    const element = await shownTo('site_manager', '/jobs', 0);
    expect(element.querySelector('.wide .count')?.textContent?.trim()).toBe('none dangerous');
    expect(element.querySelector('.wide .count svg')).toBeNull();
  });

  it('carries branch, package and dates from page to page, but not the week or the page of a list', async () => {
    const element = await shownTo(
      'site_manager',
      '/jobs?branch=HAV&package=full&last=13&week=2026-W05&cursor=x',
    );
    expect(element.querySelector('.wide a')?.getAttribute('href')).toBe(
      '/this-week?branch=HAV&package=full&last=13',
    );
  });

  it('given jobs that wait to be sent, keeps a line for them, but not on the page that says it itself', async () => {
    expect((await shownTo('recorder', '/jobs', 0, 2)).querySelector('.outbox')).not.toBeNull();
    TestBed.resetTestingModule();
    expect((await shownTo('recorder', '/send', 0, 2)).querySelector('.outbox')).toBeNull();
  });

  it('given only jobs being written, or a role that sends none, keeps no line', async () => {
    expect((await shownTo('recorder', '/jobs', 0, 0)).querySelector('.outbox')).toBeNull();
    TestBed.resetTestingModule();
    expect((await shownTo('regional_lead', '/jobs', 0, 2)).querySelector('.outbox')).toBeNull();
  });

  it('on a page behind the header’s, says its name in the narrow menu, with no bead in the wide line', async () => {
    const element = await shownTo('regional_lead', '/actions/HAV/3');
    expect(element.querySelector('button.narrow')?.textContent).toContain('Actions');
    expect(element.querySelectorAll('.wide us-bead')).toHaveLength(0);
  });
});
