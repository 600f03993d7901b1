import { TestBed } from '@angular/core/testing';
import { PersonBusy } from './person-busy';

function set(page: string) {
  document.body.innerHTML = page;
  const person = TestBed.inject(PersonBusy);
  const find = (selector: string) => document.querySelector<HTMLInputElement>(selector)!;
  const type = (selector: string): void => {
    find(selector).dispatchEvent(new Event('input', { bubbles: true }));
  };
  return { find, person, type };
}

beforeEach(() => jest.useFakeTimers());
afterEach(() => {
  document.body.innerHTML = '';
  TestBed.resetTestingModule();
  jest.useRealTimers();
});

const FORM =
  '<form><input id="amount" /><input id="sure" type="checkbox" /></form><a href="#">x</a>';
const SEARCH = '<form role="search"><input id="words" /></form>';

describe('PersonBusy', () => {
  it('given a person who reads, is not busy', () => {
    const { find, person } = set(FORM);
    expect(person.now()).toBe(false);
    find('a').focus();
    expect(person.now()).toBe(false);
  });

  it('given the focus in a field of a form, is busy until it leaves', () => {
    const { find, person } = set(FORM);
    find('#amount').focus();
    expect(person.now()).toBe(true);
    find('a').focus();
    expect(person.now()).toBe(false);
  });

  it('given something typed in a form, is busy until it is sent or gone', () => {
    const { find, person, type } = set(FORM);
    type('#amount');
    jest.advanceTimersByTime(60_000);
    expect(person.now()).toBe(true);
    find('form').dispatchEvent(new Event('submit', { bubbles: true }));
    expect(person.now()).toBe(false);
    type('#amount');
    jest.advanceTimersByTime(60_000);
    find('form').remove();
    expect(person.now()).toBe(false);
  });

  it('given words in a search, is busy while they are typed and no longer', () => {
    const { find, person, type } = set(SEARCH);
    find('#words').focus();
    type('#words');
    expect(person.now()).toBe(true);
    jest.advanceTimersByTime(5_000);
    expect(person.now()).toBe(false);
  });

  it('given a dialog, menu or panel that is open, is busy', () => {
    const { person } = set(
      '<div class="cdk-overlay-container"><div class="cdk-overlay-pane"></div></div>',
    );
    // What is left of one that was closed is no dialog.
    expect(person.now()).toBe(false);
    document.querySelector('.cdk-overlay-pane')!.innerHTML = '<p>Sure?</p>';
    expect(person.now()).toBe(true);
  });
});
