import type { Panel } from '@proofplate/recipe-model';
import { useEffect, useMemo, useState } from 'react';
import { type FieldPath, type UseFormReturn, useWatch } from 'react-hook-form';
import { ProblemError } from '../../../lib/api';
import { fieldNameFromPointer } from '../../../lib/form-problem';
import { type CouponPreview, useCouponPreview } from '../coupons.api';
import { type FieldMessage, planBody } from './plan-body';
import type { PlanValues } from './plan-values';

const TYPING_PAUSE_MS = 300;

export type LivePlan = {
  preview: CouponPreview | undefined;
  /** What stands in the way of a preview, in words, beside the messages at the fields. */
  waitsFor: readonly FieldMessage[];
  problem: ProblemError | undefined;
  isLoading: boolean;
};

/** The preview of what is typed right now. Refusals stand at their fields as soon as something was typed there. */
export function useLivePlan(form: UseFormReturn<PlanValues>, panel: Panel | undefined, locale: string): LivePlan {
  const values = useSettled(useWatch({ control: form.control }) as PlanValues);
  const read = useMemo(() => planBody(values, panel, locale), [values, panel, locale]);
  const { data, error, isLoading } = useCouponPreview('body' in read ? read.body : undefined);
  const messages = useMemo(() => ('messages' in read ? read.messages : refusedFields(error)), [read, error]);
  useFieldMessages(form, messages);
  const isAnswered = 'body' in read && error === undefined;
  return { preview: isAnswered ? data : undefined, waitsFor: messages, problem: 'body' in read ? error : undefined, isLoading };
}

/** A missing field says so after a refused submit only; while somebody fills the form in, it would nag. */
function useFieldMessages(form: UseFormReturn<PlanValues>, messages: readonly FieldMessage[]): void {
  const { setError, clearErrors } = form;
  const isSubmitted = form.formState.isSubmitted;
  useEffect(() => {
    clearErrors();
    for (const { name, message, isMissing } of messages) {
      // the names come from the plan's own fields
      if (!isMissing || isSubmitted) setError(name as FieldPath<PlanValues>, { type: 'read', message });
    }
  }, [messages, setError, clearErrors, isSubmitted]);
}

function refusedFields(error: ProblemError | undefined): FieldMessage[] {
  if (!(error instanceof ProblemError)) return [];
  return error.errors.map(({ pointer, detail }) => {
    const name = fieldNameFromPointer(pointer);
    return { name, message: detail, isMissing: detail.includes(' is needed') };
  });
}

function useSettled<T>(value: T): T {
  const [settled, setSettled] = useState(value);
  const text = JSON.stringify(value);
  useEffect(() => {
    const timer = setTimeout(() => setSettled(JSON.parse(text)), TYPING_PAUSE_MS);
    return () => clearTimeout(timer);
  }, [text]);
  return settled;
}
