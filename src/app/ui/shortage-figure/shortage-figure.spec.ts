import { TestBed } from '@angular/core/testing';
import { ShortageFigure } from './shortage-figure';

describe('ShortageFigure', () => {
  it('draws people, places and ways, and says the same in a table', async () => {
    const fixture = TestBed.createComponent(ShortageFigure);
    fixture.componentRef.setInput('people', [
      { key: 'a', name: 'Ines Varga', leftOut: true },
      { key: 'b', name: 'Ravi Menon', leftOut: false },
    ]);
    fixture.componentRef.setInput('mentors', [{ key: 'm', name: 'Edda Holm', places: 1 }]);
    fixture.componentRef.setInput('links', [
      { person: 'a', mentor: 'm' },
      { person: 'b', mentor: 'm' },
    ]);
    await fixture.whenStable();
    const host = fixture.nativeElement as HTMLElement;
    expect(host.querySelectorAll('circle')).toHaveLength(2);
    expect(host.querySelectorAll('circle.hollow')).toHaveLength(1);
    expect(host.querySelectorAll('.place')).toHaveLength(1);
    expect(host.querySelectorAll('path')).toHaveLength(2);
    expect(host.querySelector('figcaption')?.textContent).toBe('2 mentees, 1 place at 1 mentor');
    const rows = [...host.querySelectorAll('tbody tr')].map((row) => row.textContent?.replace(/\s+/gu, ' ').trim());
    expect(rows[1]).toContain('left out');
  });
});
