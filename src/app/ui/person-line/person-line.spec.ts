import { TestBed } from '@angular/core/testing';
import { provideRouter } from '@angular/router';
import { PersonLine } from './person-line';

describe('PersonLine', () => {
  it('links the name where there is a page', async () => {
    TestBed.configureTestingModule({ providers: [provideRouter([])] });
    const fixture = TestBed.createComponent(PersonLine);
    fixture.componentRef.setInput('name', 'Ruth Calloway');
    fixture.componentRef.setInput('link', ['/profiles', 7]);
    await fixture.whenStable();
    const link = (fixture.nativeElement as HTMLElement).querySelector('a');
    expect(link?.textContent).toBe('Ruth Calloway');
    expect(link?.getAttribute('href')).toBe('/profiles/7');
  });
});
