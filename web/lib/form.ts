import { zodResolver } from '@hookform/resolvers/zod';
import { type BaseSyntheticEvent, useState } from 'react';
import {
  type DefaultValues,
  type FieldValues,
  type Path,
  type UseFormReturn,
  useForm,
} from 'react-hook-form';
import type { z } from 'zod';
import { asProblem, Problem } from './problem';

/**
 * The one form helper: validates with the contract's own schema, sends, and puts what the server names back on its
 * fields. What belongs to no field stays in `problem`, for a `ProblemNotice` over the form.
 */
export function useContractForm<Values extends FieldValues, Output extends FieldValues>(options: {
  schema: z.ZodType<Output, Values>;
  defaultValues: DefaultValues<Values>;
  submit: (values: Output) => Promise<unknown>;
}): {
  form: UseFormReturn<Values, unknown, Output>;
  problem: Problem | null;
  onSubmit: (event?: BaseSyntheticEvent) => Promise<void>;
} {
  const [problem, setProblem] = useState<Problem | null>(null);
  const form = useForm<Values, unknown, Output>({
    resolver: zodResolver(options.schema),
    defaultValues: options.defaultValues,
    mode: 'onTouched',
  });
  const onSubmit = form.handleSubmit(async (values) => {
    setProblem(null);
    try {
      await options.submit(values);
    } catch (error) {
      setProblem(putOnFields(form, asProblem(error)));
    }
  });
  return { form, problem, onSubmit };
}

/** Sets the errors that point at a field of the form; answers the problem with those that do not, or null. */
export function putOnFields<Values extends FieldValues, Output extends FieldValues>(
  form: UseFormReturn<Values, unknown, Output>,
  problem: Problem,
): Problem | null {
  const names = new Set(Object.keys(form.getValues()));
  const rest = problem.errors.filter((error) => {
    const path = error.pointer?.replace(/^\//, '').replaceAll('/', '.') ?? '';
    const top = path.split('.')[0] ?? '';
    if (!names.has(top)) return true;
    const message = error.fix ? `${error.detail} ${error.fix}` : error.detail;
    form.setError(path as Path<Values>, { type: 'server', message }, { shouldFocus: true });
    return false;
  });
  if (problem.errors.length > 0 && rest.length === 0) return null;
  return new Problem({
    type: `/problems/${problem.slug}`,
    title: problem.title,
    status: problem.status,
    detail: problem.detail,
    fix: problem.fix,
    errors: rest,
    requestId: problem.requestId,
    present: problem.present,
  });
}
