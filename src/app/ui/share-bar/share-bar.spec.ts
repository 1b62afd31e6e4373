import { TestBed } from '@angular/core/testing';
import { ShareBar } from './share-bar';

describe('ShareBar', () => {
  it('draws and says the share', async () => {
    const fixture = TestBed.createComponent(ShareBar);
    fixture.componentRef.setInput('share', 0.96);
    await fixture.whenStable();
    const host = fixture.nativeElement as HTMLElement;
    expect(host.querySelector('.fill')?.getAttribute('width')).toBe('96%');
    expect(host.textContent).toContain('96\u00a0%');
  });
});
