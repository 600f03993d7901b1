import { TestBed } from '@angular/core/testing';
import { UndersideSmall } from './underside-small';

describe('UndersideSmall', () => {
  it('drawn, given areas, is shaded, not heard, and has none of the fine lines', async () => {
    const fixture = TestBed.createComponent(UndersideSmall);
    fixture.componentRef.setInput('areas', [
      { zone: 'floor', side: 'left', share: 0.5, cars: 40 },
      { zone: 'floor', side: 'right', share: null, cars: 4 },
    ]);
    await fixture.whenStable();
    const host = fixture.nativeElement as HTMLElement;
    expect(host.querySelectorAll('path.step-5')).toHaveLength(2);
    expect(host.querySelectorAll('path.few')).toHaveLength(2);
    expect(host.querySelector('svg')?.getAttribute('aria-hidden')).toBe('true');
    expect(host.querySelectorAll('.rib, .hole, .arm, .pipe, [tabindex]')).toHaveLength(0);
  });
});
