import { TestBed } from '@angular/core/testing';
import { provideRouter } from '@angular/router';
import { Answer } from './answer';

async function shown(inputs: Record<string, unknown>): Promise<HTMLElement> {
  TestBed.configureTestingModule({ providers: [provideRouter([])] });
  const fixture = TestBed.createComponent(Answer);
  for (const [name, value] of Object.entries(inputs)) fixture.componentRef.setInput(name, value);
  await fixture.whenStable();
  return fixture.nativeElement as HTMLElement;
}

describe('Answer', () => {
  it('of parts reads as one sentence with no space of the template’s own', async () => {
    const element = await shown({
      sentence: [
        'Week 5 kept ',
        { figure: '36 %' },
        ' of what it billed ',
        { quiet: '(11 cars)' },
        '.',
      ],
    });
    expect(element.querySelector('h1')?.textContent?.trim()).toBe(
      'Week 5 kept 36 % of what it billed (11 cars).',
    );
    expect(element.querySelector('.figure')?.textContent).toBe('36 %');
  });

  it('with a second line that leads on links it with its filters', async () => {
    const element = await shown({
      sentence: ['x'],
      second: [{ text: 'Four cars', link: '/jobs', query: { unbilled: 'true' } }, ' wait.'],
    });
    expect(element.querySelector('.second a')?.getAttribute('href')).toBe('/jobs?unbilled=true');
    expect(element.querySelector('.second')?.textContent?.trim()).toBe('Four cars wait.');
  });

  it('without a second line shows none', async () => {
    const element = await shown({ sentence: ['x'] });
    expect(element.querySelector('.second')).toBeNull();
  });
});
