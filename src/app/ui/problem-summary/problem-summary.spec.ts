import { ChangeDetectionStrategy, Component } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { FieldProblem, ProblemSummary } from './problem-summary';

@Component({
  selector: 'app-host-of-problem-summary',
  changeDetection: ChangeDetectionStrategy.OnPush,
  imports: [ProblemSummary],
  template: `<app-problem-summary [problems]="problems" /><input id="name" />`,
})
class Host {
  readonly problems: FieldProblem[] = [
    { field: 'name', message: 'Enter your name' },
    { field: '', message: 'Someone else changed this section' },
  ];
}

describe('ProblemSummary', () => {
  it('takes focus and leads to the field', async () => {
    Element.prototype.scrollIntoView ??= () => undefined;
    const fixture = TestBed.createComponent(Host);
    document.body.append(fixture.nativeElement as HTMLElement);
    await fixture.whenStable();
    const host = fixture.nativeElement as HTMLElement;
    expect(document.activeElement).toBe(host.querySelector('[role="alert"]'));

    host.querySelector<HTMLElement>('a')?.click();
    expect(document.activeElement?.id).toBe('name');
    host.remove();
  });

  it('draws nothing without problems', async () => {
    const fixture = TestBed.createComponent(ProblemSummary);
    fixture.componentRef.setInput('problems', []);
    await fixture.whenStable();
    expect((fixture.nativeElement as HTMLElement).querySelector('[role="alert"]')).toBeNull();
  });
});
