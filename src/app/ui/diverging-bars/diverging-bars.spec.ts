import { TestBed } from '@angular/core/testing';
import { DivergingBars } from './diverging-bars';

describe('DivergingBars', () => {
  it('hides groups that are too small, in the picture and in the table', async () => {
    const fixture = TestBed.createComponent(DivergingBars);
    fixture.componentRef.setInput('caption', 'Seekers and places');
    fixture.componentRef.setInput('rows', [
      { label: 'Hydrographic', left: 21, right: 17 },
      { label: 'Mine and tunnel', left: null, right: 9 },
    ]);
    await fixture.whenStable();
    const host = fixture.nativeElement as HTMLElement;
    expect(host.querySelectorAll('rect')).toHaveLength(2);
    expect(host.querySelector('.hidden')?.textContent).toContain('too few');
    expect(host.querySelector('table')?.textContent).toContain('hidden: too few people');
  });
});
