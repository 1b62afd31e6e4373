import { TestBed } from '@angular/core/testing';
import { ChartFigure } from './chart-figure';

describe('ChartFigure', () => {
  it('carries its caption and the numbers as a table', async () => {
    const fixture = TestBed.createComponent(ChartFigure);
    fixture.componentRef.setInput('caption', 'Fits of this plan');
    fixture.componentRef.setInput('table', { columns: ['Fit', 'Pairings'], rows: [['60 to 70', 44]] });
    await fixture.whenStable();
    const host = fixture.nativeElement as HTMLElement;
    expect(host.querySelector('figcaption')?.textContent).toBe('Fits of this plan');
    expect(host.querySelector('tbody th')?.textContent).toBe('60 to 70');
    expect(host.querySelector('tbody td')?.textContent).toBe('44');
  });

  it('says so when there is nothing to show', async () => {
    const fixture = TestBed.createComponent(ChartFigure);
    fixture.componentRef.setInput('caption', 'Fits of this plan');
    fixture.componentRef.setInput('table', { columns: ['Fit'], rows: [] });
    await fixture.whenStable();
    const host = fixture.nativeElement as HTMLElement;
    expect(host.textContent).toContain('nothing to show yet');
    expect(host.querySelector('table')).toBeNull();
  });
});
