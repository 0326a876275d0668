// @vitest-environment happy-dom
import { fireEvent, render, screen, waitFor } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { z } from 'zod';
import { Button } from '../../../web/components/ui/button';
import { FormText } from '../../../web/components/ui/form-fields';
import { ProblemNotice } from '../../../web/components/ui/problem-notice';
import { useContractForm } from '../../../web/lib/form';
import { Problem } from '../../../web/lib/problem';
import '../render-page';

const schema = z.strictObject({
  name: z.string().min(1, 'Enter a name.'),
  days: z.number('Enter a number of days.').int(),
});

function TestForm({ submit }: { submit: (values: unknown) => Promise<unknown> }) {
  const { form, problem, onSubmit } = useContractForm({
    schema,
    defaultValues: { name: '', days: 10 },
    submit,
  });
  return (
    <form onSubmit={onSubmit} noValidate>
      {problem ? <ProblemNotice problem={problem} /> : null}
      <FormText control={form.control} name="name" label="Name" />
      <FormText control={form.control} name="days" label="Days" number />
      <Button type="submit">Keep</Button>
    </form>
  );
}

const type = (label: string, value: string) =>
  fireEvent.change(screen.getByLabelText(label), { target: { value } });
const refusal = (errors: { pointer?: string; detail: string; fix?: string }[]) =>
  new Problem({
    type: '/problems/invalid-input',
    title: 'Some of what was sent cannot be used',
    status: 422,
    detail: 'See the fields.',
    fix: 'Correct them.',
    errors,
    requestId: 'r-2',
  });

describe('a form over a contract', () => {
  it('says under the field what to enter and sends nothing', async () => {
    const sent: unknown[] = [];
    render(<TestForm submit={async (values) => sent.push(values)} />);
    fireEvent.click(screen.getByText('Keep'));
    await waitFor(() => expect(screen.getByText('Enter a name.')).toBeTruthy());
    expect(screen.getByLabelText('Name').getAttribute('aria-invalid')).toBe('true');
    expect(document.activeElement).toBe(screen.getByLabelText('Name'));
    expect(sent).toEqual([]);
  });

  it('keeps what is no number as text, so that it is refused and not taken for zero', async () => {
    const sent: unknown[] = [];
    render(<TestForm submit={async (values) => sent.push(values)} />);
    type('Name', 'Carrow');
    type('Days', 'ten');
    fireEvent.click(screen.getByText('Keep'));
    await waitFor(() => expect(screen.getByText('Enter a number of days.')).toBeTruthy());
    type('Days', '12');
    fireEvent.click(screen.getByText('Keep'));
    await waitFor(() => expect(sent).toEqual([{ name: 'Carrow', days: 12 }]));
  });

  it("puts the server's refusals on the fields they point at", async () => {
    const problem = refusal([{ pointer: '/name', detail: 'This name exists.', fix: 'Choose another.' }]);
    render(<TestForm submit={() => Promise.reject(problem)} />);
    type('Name', 'Carrow');
    fireEvent.click(screen.getByText('Keep'));
    await waitFor(() => expect(screen.getByText('This name exists. Choose another.')).toBeTruthy());
    expect(screen.queryByRole('alert')).toBeNull();
  });

  it('keeps over the form what belongs to no field, with the request number', async () => {
    const problem = refusal([{ pointer: '/elsewhere', detail: 'The project is closed.' }]);
    render(<TestForm submit={() => Promise.reject(problem)} />);
    type('Name', 'Carrow');
    fireEvent.click(screen.getByText('Keep'));
    await waitFor(() => expect(screen.getByRole('alert').textContent).toContain('The project is closed.'));
    expect(screen.getByRole('alert').textContent).toContain('Request r-2');
  });
});
