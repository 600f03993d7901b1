import { TestBed } from '@angular/core/testing';
import { draw } from '../../testing/draw';
import { BridgeChart } from './bridge-chart';
import type { BridgeInput } from './bridge-input';

const data: BridgeInput = {
  summary: 'From €10.00 expected to €7.50 kept; rot labour took most.',
  rows: [
    {
      key: 'a',
      label: 'Expected',
      kind: 'total',
      value: 1000,
      text: '10.00',
      role: 'expected',
      strong: true,
    },
    {
      key: 'b',
      label: 'Rot labour',
      kind: 'step',
      value: -250,
      text: '−2.50',
      role: 'loss',
      strong: true,
    },
    {
      key: 'c',
      label: 'Fee',
      kind: 'step',
      value: 0,
      text: '0.00',
      role: 'neutral',
      strong: false,
    },
    {
      key: 'd',
      label: 'Kept',
      kind: 'total',
      value: 750,
      text: '7.50',
      role: 'kept',
      strong: true,
    },
  ],
};

describe('BridgeChart', () => {
  it('drawn: text alternative, words and amounts as text, bars by role, the named step in 600', async () => {
    const { host } = await draw(BridgeChart, { data }, 412);
    expect(host.querySelector('[role=img]')?.getAttribute('aria-label')).toBe(data.summary);
    const texts = [...host.querySelectorAll('text')].map((text) => text.textContent.trim());
    expect(texts).toEqual([
      'Expected',
      '10.00',
      'Rot labour',
      '−2.50',
      'Fee',
      '0.00',
      'Kept',
      '7.50',
    ]);
    const bars = [...host.querySelectorAll('rect')].map((bar) => bar.getAttribute('class'));
    expect(bars).toEqual(['bar expected', 'bar loss', 'bar neutral', 'bar kept']);
    expect(host.querySelectorAll('text.strong')).toHaveLength(6);
  });

  it('not measured yet: nothing drawn, its room kept', async () => {
    const fixture = TestBed.createComponent(BridgeChart);
    fixture.componentRef.setInput('data', data);
    await fixture.whenStable();
    const host = fixture.nativeElement as HTMLElement;
    expect(host.querySelector('svg')).toBeNull();
    expect(host.style.minHeight).toBe('138px');
  });
});
