import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatProgressBar } from '@angular/material/progress-bar';

/** Long work in the background: how far, at what, since when, and a way to stop it. */
@Component({
  selector: 'app-progress-panel',
  imports: [MatButton, MatProgressBar],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './progress-panel.html',
  styleUrl: './progress-panel.scss',
})
export class ProgressPanel {
  readonly label = input.required<string>();
  /** 0 to 100; null while the amount of work is not known. */
  readonly percent = input<number | null>(null);
  readonly stage = input('');
  readonly elapsedSeconds = input<number | null>(null);
  readonly cancellable = input(true);
  readonly note = input('You may leave this page; the work goes on.');
  readonly cancelled = output<void>();

  protected readonly percentInWords = computed(() => {
    const percent = this.percent();
    return percent === null ? '' : `${Math.round(percent)}\u00a0%`;
  });
  protected readonly elapsed = computed(() => durationInWords(this.elapsedSeconds()));
  // Only the stage is announced: reading out every per cent would drown everything else.
  protected readonly announced = computed(() => (this.stage() ? `${this.label()}: ${this.stage()}` : this.label()));
}

/** Seconds as "48 s" or "3 min 05 s"; empty when not known. */
export function durationInWords(seconds: number | null): string {
  if (seconds === null) return '';
  const whole = Math.max(0, Math.round(seconds));
  if (whole < 60) return `${whole}\u00a0s`;
  return `${Math.floor(whole / 60)}\u00a0min ${String(whole % 60).padStart(2, '0')}\u00a0s`;
}
