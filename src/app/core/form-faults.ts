import type { AbstractControl, FormGroup, ValidatorFn } from '@angular/forms';
import type { z } from 'zod';
import type { FieldFault } from '../../../shared/problems/problems';

/** A control's validator made from the contract's schema, so that both sides say the same sentence. */
export function asContract(schema: z.ZodType): ValidatorFn {
  return (control) => {
    const result = schema.safeParse(control.value);
    return result.success ? null : { contract: result.error.issues[0]?.message ?? 'Please check this field' };
  };
}

/** The sentence to show beside a field; empty where nothing is wrong. */
export function faultOf(control: AbstractControl): string {
  const errors = control.errors;
  if (!errors) return '';
  const own: unknown = errors['server'] ?? errors['contract'];
  if (typeof own === 'string') return own;
  return errors['required'] ? 'Please fill in this field' : 'Please check this field';
}

/** All faults of a form, for the summary at its top; ids of fields are their names. */
export function faultsOf(form: FormGroup): FieldFault[] {
  return Object.entries(form.controls)
    .map(([field, control]) => ({ field, message: faultOf(control) }))
    .filter((fault) => fault.message !== '');
}
