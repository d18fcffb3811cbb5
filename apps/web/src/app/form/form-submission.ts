import { signal } from '@angular/core';
import { FormControl, type FormGroup } from '@angular/forms';
import { filter, Subscription, take } from 'rxjs';
import type * as z from 'zod';
import { type FieldFault, ProblemError, sentenceOf } from '../api/problem-error';

/**
 * Sends one form: checks it against the contract's schema, shows what is refused (here or by the server) at the
 * fields, and keeps what there is to say about the whole of it.
 */
export class FormSubmission {
  /** Whether an answer is awaited. */
  readonly busy = signal(false);
  /** One sentence about the last try, when it failed. */
  readonly message = signal<string | null>(null);
  /** Whether the thing was changed by somebody else since it was loaded (status 412). */
  readonly conflict = signal(false);
  private mending = Subscription.EMPTY;

  /** @returns Whether it was accepted. */
  async send<Schema extends z.ZodType>(
    form: FormGroup,
    schema: Schema,
    work: (body: z.input<Schema>) => Promise<void>,
  ): Promise<boolean> {
    if (this.busy()) return false;
    this.clear();
    const body: unknown = form.getRawValue();
    const check = schema.safeParse(body);
    if (!check.success) {
      const faults = check.error.issues.map((issue) => ({
        path: issue.path.join('.'),
        message: issue.message,
      }));
      this.refuse(form, faults, 'Nothing was sent yet:');
      return false;
    }
    this.busy.set(true);
    try {
      await work(body as z.input<Schema>); // safeParse has just accepted it
      return true;
    } catch (error) {
      this.fail(form, error);
      return false;
    } finally {
      this.busy.set(false);
    }
  }

  clear(): void {
    this.mending.unsubscribe();
    this.message.set(null);
    this.conflict.set(false);
  }

  private fail(form: FormGroup, error: unknown): void {
    if (error instanceof ProblemError && error.fields.length > 0) {
      this.refuse(form, error.fields, 'The server did not take this:');
      return;
    }
    this.conflict.set(error instanceof ProblemError && error.status === 412);
    this.message.set(sentenceOf(error));
  }

  private refuse(form: FormGroup, faults: readonly FieldFault[], opening: string): void {
    const elsewhere = faults.filter((fault) => !showAtField(form, fault));
    const atFields = faults.length - elsewhere.length;
    const parts = [
      ...(atFields === 1 ? ['one field needs another value'] : []),
      ...(atFields > 1 ? [`${atFields} fields need another value`] : []),
      ...elsewhere.map(({ path, message }) => (path === '' ? message : `${path} ${message}`)),
    ];
    this.message.set(`${opening} ${parts.join('; ')}.`);
    if (elsewhere.length > 0) return;
    // Once every refused field has another value the sentence would no longer be true.
    this.mending = form.statusChanges
      .pipe(
        filter((status) => status === 'VALID'),
        take(1),
      )
      .subscribe(() => {
        this.clear();
      });
  }
}

function showAtField(form: FormGroup, fault: FieldFault): boolean {
  const control = form.get(fault.path);
  if (!(control instanceof FormControl)) return false;
  control.setErrors({ fault: fault.message });
  return true;
}
