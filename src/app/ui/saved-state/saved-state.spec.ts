import { TestBed } from '@angular/core/testing';
import { Saved, SavedState } from './saved-state';

describe('SavedState', () => {
  it.each<[Saved, string]>([
    [{ kind: 'idle' }, ''],
    [{ kind: 'saving' }, 'Saving…'],
    [{ kind: 'saved', at: new Date(2026, 11, 1, 14, 32) }, 'Saved 14:32'],
    [{ kind: 'failed', message: 'the connection is down' }, 'Not saved: the connection is down'],
  ])('says %o', async (state, words) => {
    const fixture = TestBed.createComponent(SavedState);
    fixture.componentRef.setInput('state', state);
    await fixture.whenStable();
    const host = fixture.nativeElement as HTMLElement;
    expect(host.getAttribute('role')).toBe('status');
    expect(host.textContent?.trim()).toBe(words);
  });
});
