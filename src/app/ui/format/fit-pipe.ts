import { Pipe, PipeTransform } from '@angular/core';

/** A fit of 0 to 10000 as people read it: 0 to 100 with one decimal. */
export function fitInWords(fit: number): string {
  return (fit / 100).toFixed(1);
}

/** `{{ 7140 | fit }}` → "71.4"; a missing fit is an en dash. */
@Pipe({ name: 'fit' })
export class FitPipe implements PipeTransform {
  transform(fit: number | null | undefined): string {
    return fit === null || fit === undefined ? '–' : fitInWords(fit);
  }
}
