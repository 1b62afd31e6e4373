/** Errors as the API tells them. Verbs throw a Problem; only this file knows status numbers. */
import type { z } from 'zod';
import type { FieldFault, ProblemCode, ProblemDetails } from '../../../shared/problems/problems';

export const HTTP_STATUS = {
  invalid: 400,
  unauthenticated: 401,
  forbidden: 403,
  'not-found': 404,
  conflict: 409,
  stale: 412,
  'too-large': 413,
  'unsupported-media-type': 415,
  unprocessable: 422,
  'version-required': 428,
  'too-many-requests': 429,
  fault: 500,
  unavailable: 503,
} as const satisfies Record<ProblemCode, number>;

export interface ProblemExtras {
  fields?: FieldFault[];
  detail?: string;
  /** The state somebody else saved meanwhile, so that both versions are at hand. */
  current?: unknown;
  retryAfterSeconds?: number;
}

export class Problem extends Error {
  constructor(
    readonly code: ProblemCode,
    /** A sentence for the person who asked. */
    readonly title: string,
    readonly extras: ProblemExtras = {},
  ) {
    super(title);
    this.name = 'Problem';
  }

  toDetails(instance: string): ProblemDetails {
    const { fields, detail, current } = this.extras;
    return {
      type: `/problems/${this.code}`,
      title: this.title,
      status: HTTP_STATUS[this.code],
      code: this.code,
      instance,
      ...(detail === undefined ? {} : { detail }),
      ...(fields === undefined ? {} : { fields }),
      ...(current === undefined ? {} : { current }),
    };
  }
}

/** One answer for what does not exist and for what is somebody else's. */
export const notFound = (what: string): Problem => new Problem('not-found', `There is no such ${what}`);

/** Somebody else saved a newer version. */
export const stale = (current: unknown): Problem =>
  new Problem('stale', 'Somebody else saved this meanwhile; compare both versions and save again', { current });

/** The one door for input from outside; a schema that fails anywhere else is our own fault. */
export function read<S extends z.ZodType>(schema: S, input: unknown): z.output<S> {
  const result = schema.safeParse(input);
  if (result.success) return result.data;
  throw new Problem('invalid', 'Some fields need another look', { fields: fieldFaults(result.error) });
}

function fieldFaults(error: z.ZodError): FieldFault[] {
  return error.issues.map((issue) =>
    issue.code === 'unrecognized_keys'
      ? { field: [...issue.path, issue.keys[0]].join('.'), message: 'This field is not known here' }
      : { field: issue.path.join('.'), message: issue.message },
  );
}
