import { FormControl, FormGroup } from '@angular/forms';
import * as z from 'zod';
import { ProblemError } from '../api/problem-error';
import { FormSubmission } from './form-submission';

const schema = z.strictObject({
  name: z.string().min(1, 'needs a name'),
  site: z.strictObject({ latitude: z.number() }),
});

function emptyForm() {
  return new FormGroup({
    name: new FormControl(''),
    site: new FormGroup({ latitude: new FormControl<number | null>(null) }),
  });
}
function filledForm() {
  const form = emptyForm();
  form.setValue({ name: 'North pier', site: { latitude: 47 } });
  return form;
}
const problem = (status: number, errors?: { path: string; message: string }[]) =>
  new ProblemError({ type: 'x', title: 'x', status, detail: 'The server says no.', errors });

describe('the submission of a form', () => {
  it('sends nothing while a field is off the contract, and says so at the field', async () => {
    const [form, submission, work] = [emptyForm(), new FormSubmission(), vi.fn()];
    form.patchValue({ site: { latitude: 47 } });
    expect(await submission.send(form, schema, work)).toBe(false);
    expect(work).not.toHaveBeenCalled();
    expect(form.controls.name.errors).toEqual({ fault: 'needs a name' });
    expect(submission.message()).toContain('one field');
  });

  it('withdraws its sentence once every refused field has another value', async () => {
    const [form, submission] = [emptyForm(), new FormSubmission()];
    await submission.send(form, schema, vi.fn());
    expect(submission.message()).toContain('2 fields');
    form.patchValue({ name: 'North pier' });
    expect(submission.message()).toContain('2 fields');
    form.patchValue({ site: { latitude: 47 } });
    expect(submission.message()).toBeNull();
  });

  it('shows what the server refused at the field that its path names', async () => {
    const [form, submission] = [filledForm(), new FormSubmission()];
    const errors = [{ path: 'site.latitude', message: 'is not on land' }];
    await submission.send(form, schema, () => Promise.reject(problem(400, errors)));
    expect(form.controls.site.controls.latitude.errors).toEqual({ fault: 'is not on land' });
    expect(submission.busy()).toBe(false);
  });

  it('puts a refusal that no field can show into the message', async () => {
    const [form, submission] = [filledForm(), new FormSubmission()];
    const errors = [{ path: 'mount.kind', message: 'is not known' }];
    await submission.send(form, schema, () => Promise.reject(problem(400, errors)));
    expect(submission.message()).toContain('mount.kind is not known');
  });

  it('marks a conflict when somebody else saved in the meantime', async () => {
    const [form, submission] = [filledForm(), new FormSubmission()];
    await submission.send(form, schema, () => Promise.reject(problem(412)));
    expect(submission.conflict()).toBe(true);
    expect(submission.message()).toBe('The server says no.');
  });

  it('forgets the last failure when the next try is accepted', async () => {
    const [form, submission] = [filledForm(), new FormSubmission()];
    await submission.send(form, schema, () => Promise.reject(problem(500)));
    expect(await submission.send(form, schema, () => Promise.resolve())).toBe(true);
    expect(submission.message()).toBeNull();
  });

  it('does not send twice while it waits', async () => {
    const [form, submission] = [filledForm(), new FormSubmission()];
    let answer: (() => void) | undefined;
    const waiting = new Promise<void>((done) => (answer = done));
    const first = submission.send(form, schema, () => waiting);
    const work = vi.fn();
    expect(await submission.send(form, schema, work)).toBe(false);
    answer?.();
    expect(await first).toBe(true);
    expect(work).not.toHaveBeenCalled();
  });
});
