import { Pipe, PipeTransform } from '@angular/core';

/** A share of 0 to 1 in per cent: 0.934 → "93 %"; with a no-break space, as ISO 80000-1 writes it. */
export function shareInWords(share: number, decimals = 0): string {
  return `${(share * 100).toFixed(decimals)}\u00a0%`;
}

/** `{{ 0.934 | share }}` → "93 %"; a missing share is an en dash. */
@Pipe({ name: 'share' })
export class SharePipe implements PipeTransform {
  transform(share: number | null | undefined, decimals = 0): string {
    return share === null || share === undefined ? '–' : shareInWords(share, decimals);
  }
}
