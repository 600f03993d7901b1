import type { Type } from '@angular/core';
import { TestBed, type ComponentFixture } from '@angular/core/testing';

/** Draws a picture with its inputs as wide as said, px; jsdom has no layout, so the width is only told while it is drawn. */
export async function draw<Picture>(
  type: Type<Picture>,
  inputs: Readonly<Record<string, unknown>>,
  width: number,
): Promise<{ fixture: ComponentFixture<Picture>; host: HTMLElement }> {
  const measured = jest
    .spyOn(HTMLElement.prototype, 'getBoundingClientRect')
    .mockReturnValue({ width, height: 0 } as DOMRect);
  const fixture = TestBed.createComponent(type);
  for (const [name, value] of Object.entries(inputs)) fixture.componentRef.setInput(name, value);
  await fixture.whenStable();
  measured.mockRestore();
  return { fixture, host: fixture.nativeElement as HTMLElement };
}
