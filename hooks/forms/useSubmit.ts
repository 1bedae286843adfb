import { useState } from 'react';
import type { FieldPath, FieldValues, UseFormReturn } from 'react-hook-form';
import { ApiProblem } from '@/hooks/api/ApiProblem';

export interface Submit {
  submit: () => void;
  busy: boolean;
  /** What went wrong beyond single fields. */
  problem: ApiProblem | null;
}

/**
 * Sends a form that its schema has passed. What the server finds wrong with single fields is shown at them;
 * everything else is the form's problem. `done` is called with the answer.
 */
export function useSubmit<V extends FieldValues, C, O extends FieldValues, R>(
  form: UseFormReturn<V, C, O>,
  send: (values: O) => Promise<R>,
  done: (answer: R) => void,
): Submit {
  const [busy, setBusy] = useState(false);
  const [problem, setProblem] = useState<ApiProblem | null>(null);

  const attempt = async (values: O) => {
    setBusy(true);
    setProblem(null);
    try {
      done(await send(values));
    } catch (error) {
      if (!(error instanceof ApiProblem)) throw error;
      const fields = Object.entries(error.fields);
      const known = fields.filter(([name]) => form.getValues(name as FieldPath<V>) !== undefined);
      for (const [name, message] of known) form.setError(name as FieldPath<V>, { type: 'server', message });
      if (known.length === 0 || known.length < fields.length) setProblem(error);
    } finally {
      setBusy(false);
    }
  };
  const run = form.handleSubmit(attempt);
  return { submit: () => void run(), busy, problem };
}
