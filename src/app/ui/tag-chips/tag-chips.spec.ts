import { TestBed } from '@angular/core/testing';
import { TagChips } from './tag-chips';

describe('TagChips', () => {
  it('says which tags are shared and tells which to remove', async () => {
    const fixture = TestBed.createComponent(TagChips);
    fixture.componentRef.setInput('tags', [
      { key: 'a', label: 'Laser scanning', shared: true },
      { key: 'b', label: 'Monitoring' },
    ]);
    fixture.componentRef.setInput('removable', true);
    const removed: string[] = [];
    fixture.componentInstance.removed.subscribe((key) => removed.push(key));
    await fixture.whenStable();
    const host = fixture.nativeElement as HTMLElement;
    expect(host.querySelector('.chip--shared')?.textContent).toContain('shared:');
    host.querySelector<HTMLElement>('[aria-label="Remove Monitoring"]')?.click();
    expect(removed).toEqual(['b']);
  });
});
