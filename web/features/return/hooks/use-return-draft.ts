import { zodResolver } from '@hookform/resolvers/zod';
import { useQueryClient } from '@tanstack/react-query';
import { useEffect, useRef, useState } from 'react';
import { useForm } from 'react-hook-form';
import { type ReturnFields, type ReturnView, returnFieldsSchema } from '#shared/contracts/returns';
import { putOnFields } from '../../../lib/form';
import { asProblem, type Problem } from '../../../lib/problem';
import type { RevisionParams } from '../../../lib/queries/revision-query';
import { useChangeReturn } from '../api/change-return';
import { returnQuery } from '../api/get-return';
import { returnValues, sameValues } from '../lib/return-values';

const restMilliseconds = 900;

/**
 * The form of a return. What is entered is kept as a draft when the typing rests, quietly; `keep` does it at once and
 * answers the version that holds everything entered, or null, so that nothing else is ever signed.
 */
export function useReturnDraft(params: RevisionParams, view: ReturnView) {
  const client = useQueryClient();
  const { queryKey } = returnQuery(params);
  const change = useChangeReturn(params);
  const [problem, setProblem] = useState<Problem | null>(null);
  const kept = useRef(returnValues(view));
  const form = useForm<ReturnFields, unknown, ReturnFields>({
    resolver: zodResolver(returnFieldsSchema),
    defaultValues: kept.current,
    mode: 'onTouched',
    shouldFocusError: false,
  });

  const keepNow = async (): Promise<number | null> => {
    const values = form.getValues();
    if (sameValues(values, kept.current)) return client.getQueryData(queryKey)?.version ?? view.version;
    const parsed = returnFieldsSchema.safeParse(values);
    if (!parsed.success) {
      await form.trigger();
      return null;
    }
    try {
      const { version } = await change.mutateAsync(parsed.data);
      kept.current = structuredClone(values);
      setProblem(null);
      return version;
    } catch (error) {
      setProblem(putOnFields(form, asProblem(error)));
      return null;
    }
  };

  // One after the other, so that what the first has kept is not kept again, behind the back of what is being signed.
  const last = useRef<Promise<number | null>>(Promise.resolve(null));
  const keep = (): Promise<number | null> => {
    last.current = last.current.then(keepNow, keepNow);
    return last.current;
  };
  const latestKeep = useRef(keep);
  latestKeep.current = keep;
  const canChange = view.abilities.change;
  useEffect(() => {
    if (!canChange) return;
    let timer: ReturnType<typeof setTimeout> | undefined;
    const subscription = form.watch(() => {
      clearTimeout(timer);
      timer = setTimeout(() => {
        timer = undefined;
        void latestKeep.current();
      }, restMilliseconds);
    });
    return () => {
      subscription.unsubscribe();
      if (timer === undefined) return;
      clearTimeout(timer);
      void latestKeep.current();
    };
  }, [form, canChange]);

  /** Another tab or person changed the draft: either its state is taken, or this one is written over it. */
  const takePresent = async () => {
    const present = await client.fetchQuery({ ...returnQuery(params), staleTime: 0 });
    kept.current = returnValues(present);
    form.reset(kept.current);
    setProblem(null);
  };
  const keepMine = async () => {
    await client.fetchQuery({ ...returnQuery(params), staleTime: 0 });
    await keep();
  };
  return { form, keep, problem, isKeeping: change.isPending, takePresent, keepMine };
}
