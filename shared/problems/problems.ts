/** Problem details for HTTP APIs (RFC 9457): the one shape of every error answer. */
import { z } from 'zod';

export const ProblemCode = z.enum([
  'invalid',
  'unauthenticated',
  'forbidden',
  'not-found',
  'conflict',
  'stale',
  'too-large',
  'unsupported-media-type',
  'unprocessable',
  'version-required',
  'too-many-requests',
  'unavailable',
  'fault',
]);
export type ProblemCode = z.infer<typeof ProblemCode>;

/** What is wrong with one field: its path in the request (`about.name`) and a sentence for the person who filled it. */
export const FieldFault = z.object({ field: z.string(), message: z.string() });
export type FieldFault = z.infer<typeof FieldFault>;

export const ProblemDetails = z.object({
  type: z.string(),
  title: z.string(),
  status: z.int(),
  detail: z.string().optional(),
  instance: z.string().optional(),
  code: ProblemCode,
  fields: z.array(FieldFault).optional(),
  /** The current state of what was to be changed, where somebody else changed it meanwhile. */
  current: z.unknown().optional(),
});
export type ProblemDetails = z.infer<typeof ProblemDetails>;
