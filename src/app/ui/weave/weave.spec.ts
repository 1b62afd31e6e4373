import { TestBed } from '@angular/core/testing';
import { Weave } from './weave';

describe('Weave', () => {
  it('is hidden from screen readers and carries its state as a class', async () => {
    const fixture = TestBed.createComponent(Weave);
    fixture.componentRef.setInput('state', 'ahead');
    await fixture.whenStable();
    const host = fixture.nativeElement as HTMLElement;
    expect(host.getAttribute('aria-hidden')).toBe('true');
    expect(host.classList).toContain('ahead');
  });
});
