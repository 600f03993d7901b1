import { ChangeDetectionStrategy, Component } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { Hatch } from './hatch';

@Component({
  selector: 'us-two-hatches',
  imports: [Hatch],
  template: `
    <svg>
      <defs>
        <pattern us-hatch #one="usHatch" />
        <pattern us-hatch #other="usHatch" [pitch]="4" [line]="1" />
      </defs>
      <rect [attr.fill]="one.fill" />
      <rect [attr.fill]="other.fill" />
    </svg>
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
class TwoHatches {}

describe('Hatch', () => {
  it('two on a page: each fills by its own name, in its own measure', async () => {
    const fixture = TestBed.createComponent(TwoHatches);
    await fixture.whenStable();
    const host = fixture.nativeElement as HTMLElement;
    const patterns = [...host.querySelectorAll('pattern')];
    const fills = [...host.querySelectorAll('svg > rect')].map((rect) => rect.getAttribute('fill'));
    expect(fills).toEqual(patterns.map(({ id }) => `url(#${id})`));
    expect(new Set(fills).size).toBe(2);
    expect(patterns.map((pattern) => pattern.getAttribute('width'))).toEqual(['7', '4']);
    // A shape of another namespace would be no shape.
    const line = patterns[1]!.querySelector('rect')!;
    expect(line.namespaceURI).toBe('http://www.w3.org/2000/svg');
    expect(line.getAttribute('width')).toBe('1');
  });
});
