import { TestBed } from '@angular/core/testing';
import { provideRouter } from '@angular/router';
import { PageHeader } from './page-header';

describe('PageHeader', () => {
  it('has one title that can take focus, and crumbs that lead back', async () => {
    TestBed.configureTestingModule({ providers: [provideRouter([])] });
    const fixture = TestBed.createComponent(PageHeader);
    fixture.componentRef.setInput('title', 'Plan of run 6');
    fixture.componentRef.setInput('crumbs', [{ label: 'Cycles', link: '/cycles' }, { label: 'Winter 2026–27' }]);
    await fixture.whenStable();
    const host = fixture.nativeElement as HTMLElement;
    expect(host.querySelector('h1')?.textContent).toBe('Plan of run 6');
    expect(host.querySelector('h1')?.getAttribute('tabindex')).toBe('-1');
    expect(host.querySelector('nav a')?.getAttribute('href')).toBe('/cycles');
  });
});
