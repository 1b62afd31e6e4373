import { TestBed } from '@angular/core/testing';
import { BigFigure } from './big-figure';
import { SmallFigures } from './small-figures';

describe('BigFigure', () => {
  it('shows the number with its words', async () => {
    const fixture = TestBed.createComponent(BigFigure);
    fixture.componentRef.setInput('value', 145);
    fixture.componentRef.setInput('label', 'of 156 mentees paired');
    await fixture.whenStable();
    const words = (fixture.nativeElement as HTMLElement).textContent;
    expect(words).toContain('145');
    expect(words).toContain('of 156 mentees paired');
  });
});

describe('SmallFigures', () => {
  it('lists names and values', async () => {
    const fixture = TestBed.createComponent(SmallFigures);
    fixture.componentRef.setInput('items', [{ label: 'Mean fit', value: '71.4' }]);
    await fixture.whenStable();
    const host = fixture.nativeElement as HTMLElement;
    expect(host.querySelector('dt')?.textContent).toBe('Mean fit');
    expect(host.querySelector('dd')?.textContent).toBe('71.4');
  });
});
