import { TestBed } from '@angular/core/testing';
import { DistributionBars } from './distribution-bars';

describe('DistributionBars', () => {
  it('draws a bar a bin and names every edge once', async () => {
    const fixture = TestBed.createComponent(DistributionBars);
    fixture.componentRef.setInput('caption', 'Fits of this plan');
    fixture.componentRef.setInput('bins', [
      { from: 50, to: 60, count: 18 },
      { from: 60, to: 70, count: null },
    ]);
    await fixture.whenStable();
    const host = fixture.nativeElement as HTMLElement;
    expect(host.querySelectorAll('rect')).toHaveLength(2);
    const words = [...host.querySelectorAll('svg text')].map((text) => text.textContent?.trim());
    expect(words).toEqual(['18', 'hidden', '50', '60', '70', 'fit']);
  });
});
