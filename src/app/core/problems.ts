import { HttpErrorResponse } from '@angular/common/http';
import type { AbstractControl, FormGroup } from '@angular/forms';
import { type FieldFault, ProblemDetails } from '../../../shared/problems/problems';

/** What the server said was wrong, or a sentence for when nothing could be heard from it. */
export function problemOf(error: unknown): ProblemDetails {
  if (error instanceof HttpErrorResponse) {
    const body: unknown = typeof error.error === 'string' ? parsed(error.error) : error.error;
    const details = ProblemDetails.safeParse(body);
    if (details.success) return details.data;
    if (error.status === 0) return unreachable();
  }
  return {
    type: '/problems/fault',
    title: 'Something went wrong. Nothing was changed; please try again',
    status: 500,
    code: 'fault',
  };
}

const unreachable = (): ProblemDetails => ({
  type: '/problems/unavailable',
  title: 'The server cannot be reached. What you typed is still here; try again in a moment',
  status: 503,
  code: 'unavailable',
});

function parsed(text: string): unknown {
  try {
    return JSON.parse(text);
  } catch {
    return null;
  }
}

/** Puts each field's sentence beside its field (error key `server`); returns those that belong to no field of the form. */
export function applyProblem(form: FormGroup, problem: ProblemDetails): FieldFault[] {
  const rest: FieldFault[] = [];
  for (const fault of problem.fields ?? []) {
    const control: AbstractControl | null = form.get(fault.field);
    if (!control) rest.push(fault);
    else {
      control.setErrors({ ...control.errors, server: fault.message });
      control.markAsTouched();
    }
  }
  return rest;
}
