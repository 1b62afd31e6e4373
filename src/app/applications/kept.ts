import type { z } from 'zod';

/** A choice of this browser's user that is kept between visits; null where there is none, or none that still fits. */
export function readKept<S extends z.ZodType>(key: string, schema: S): z.output<S> | null {
  try {
    const result = schema.safeParse(JSON.parse(localStorage.getItem(key) ?? 'null'));
    return result.success ? result.data : null;
  } catch {
    return null;
  }
}

/** A browser that keeps nothing is no fault: the choice then lasts as long as the page. */
export function keep(key: string, value: unknown): void {
  try {
    localStorage.setItem(key, JSON.stringify(value));
  } catch {
    return;
  }
}
