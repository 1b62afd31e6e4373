import { ChangeDetectionStrategy, Component } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { FormControl, ReactiveFormsModule } from '@angular/forms';
import { AvailabilityGrid } from './availability-grid';

@Component({
  selector: 'app-host-of-availability-grid',
  changeDetection: ChangeDetectionStrategy.OnPush,
  imports: [AvailabilityGrid, ReactiveFormsModule],
  template: `<app-availability-grid [formControl]="slots" />`,
})
class Host {
  readonly slots = new FormControl<string[]>(['tue-evening'], { nonNullable: true });
}

describe('AvailabilityGrid', () => {
  async function draw() {
    const fixture = TestBed.createComponent(Host);
    document.body.append(fixture.nativeElement as HTMLElement);
    await fixture.whenStable();
    const host = fixture.nativeElement as HTMLElement;
    const cell = (name: string) => host.querySelector<HTMLButtonElement>(`[aria-label="${name}"]`);
    return { fixture, host, cell };
  }

  it('gives the chosen slots in the order of the week', async () => {
    const { fixture, host, cell } = await draw();
    cell('Monday midday')?.click();
    await fixture.whenStable();
    expect(fixture.componentInstance.slots.value).toEqual(['mon-midday', 'tue-evening']);
    expect(cell('Monday midday')?.getAttribute('aria-pressed')).toBe('true');

    cell('Tuesday evening')?.click();
    expect(fixture.componentInstance.slots.value).toEqual(['mon-midday']);
    host.remove();
  });

  it('has one tab stop and moves with the arrow keys', async () => {
    const { fixture, host, cell } = await draw();
    expect(host.querySelectorAll('button[tabindex="0"]')).toHaveLength(1);
    cell('Monday morning')?.focus();
    cell('Monday morning')?.dispatchEvent(new KeyboardEvent('keydown', { key: 'ArrowRight', bubbles: true }));
    await fixture.whenStable();
    expect(document.activeElement).toBe(cell('Tuesday morning'));
    host.remove();
  });

  it('only reads where it is read-only', async () => {
    const fixture = TestBed.createComponent(AvailabilityGrid);
    fixture.componentRef.setInput('readOnly', true);
    fixture.componentRef.setInput('slots', ['sun-evening']);
    await fixture.whenStable();
    const host = fixture.nativeElement as HTMLElement;
    expect(host.querySelectorAll('button')).toHaveLength(0);
    expect(host.querySelectorAll('.chosen')).toHaveLength(1);
  });
});
