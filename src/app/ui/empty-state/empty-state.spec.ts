import { ChangeDetectionStrategy, Component } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { EmptyState } from './empty-state';

@Component({
  selector: 'app-host-of-empty-state',
  changeDetection: ChangeDetectionStrategy.OnPush,
  imports: [EmptyState],
  template: `<app-empty-state title="No cycle yet" text="Start with its dates."
    ><button>Plan a cycle</button></app-empty-state
  >`,
})
class Host {}

describe('EmptyState', () => {
  it('says what is missing and shows the next step', async () => {
    const fixture = TestBed.createComponent(Host);
    await fixture.whenStable();
    const host = fixture.nativeElement as HTMLElement;
    expect(host.querySelector('h2')?.textContent).toBe('No cycle yet');
    expect(host.querySelector('button')?.textContent).toBe('Plan a cycle');
  });
});
