import { startTransition, useEffect, useMemo, useRef, useState } from 'react';
import type { FieldPath, UseFormReturn } from 'react-hook-form';
import { ProblemError } from '../../../lib/api';
import { fieldNameFromPointer } from '../../../lib/form-problem';
import { type CouponPreview, type Machine, type ShopCaution, useCouponPreview } from '../coupons.api';
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
export function useLivePlan(
  form: UseFormReturn<PlanValues>,
  { machine, never, locale }: { machine: Machine | undefined; never: ShopCaution | undefined; locale: string },
): LivePlan {
  const values = useSettledValues(form);
  const read = useMemo(() => planBody(values, machine?.profile, locale), [values, machine, locale]);
  const { data, error, isLoading } = useCouponPreview('body' in read ? read.body : undefined);
  const messages = useMemo(() => ('messages' in read ? read.messages : refusedFields(error)), [read, error]);
  const shown = useMemo(() => {
    const ground = groundMessages(never, data?.cautions, values);
    // forbidden work has no other field to mend
    return never === undefined ? [...messages, ...ground] : ground;
  }, [never, data, values, messages]);
  useFieldMessages(form, shown);
  const isAnswered = 'body' in read && error === undefined;
  return { preview: isAnswered ? data : undefined, waitsFor: messages, problem: 'body' in read ? error : undefined, isLoading };
}

/** A missing field says so after a refused submit only; while somebody fills the form in, it would nag. */
function useFieldMessages(form: UseFormReturn<PlanValues>, messages: readonly FieldMessage[]): void {
  const { setError, clearErrors } = form;
  const isSubmitted = form.formState.isSubmitted;
  const shown = useRef('[]');
  useEffect(() => {
    const said = messages.filter(({ isMissing }) => !isMissing || isSubmitted);
    const text = JSON.stringify(said);
    // to say the same again would draw every field again
    if (text === shown.current && !isSubmitted) return;
    shown.current = text;
    clearErrors();
    // the names come from the plan's own fields
    for (const { name, message } of said) setError(name as FieldPath<PlanValues>, { type: 'read', message });
  }, [messages, setError, clearErrors, isSubmitted]);
}

/** What no field of the setting can say: the work is forbidden, or its cautions are not read yet. */
export function groundMessages(
  never: Pick<ShopCaution, 'subject'> | undefined,
  cautions: CouponPreview['cautions'] | undefined,
  { acknowledgedCautionIds }: Pick<PlanValues, 'acknowledgedCautionIds'>,
): FieldMessage[] {
  if (never !== undefined) return [{ name: 'materialId', message: 'This must not be marked. Choose another material.', isMissing: false }];
  const isRead = cautions === undefined || cautions.every(({ id }) => acknowledgedCautionIds.includes(id));
  if (isRead) return [];
  const which = cautions.length === 1 ? 'the caution' : `the ${cautions.length} cautions`;
  return [{ name: 'acknowledgedCautionIds', message: `Read ${which} for this work and say so.`, isMissing: true }];
}

function refusedFields(error: ProblemError | undefined): FieldMessage[] {
  if (!(error instanceof ProblemError)) return [];
  return error.errors.map(({ pointer, detail }) => {
    const name = fieldNameFromPointer(pointer);
    return { name, message: detail, isMissing: detail.includes(' is needed') };
  });
}

/** What is typed, once the keys rest. Nothing is drawn again while they don't: the numbers beside the form watch for themselves. */
function useSettledValues(form: UseFormReturn<PlanValues>): PlanValues {
  const [settled, setSettled] = useState(() => structuredClone(form.getValues()));
  useEffect(() => {
    let timer: ReturnType<typeof setTimeout> | undefined;
    const settle = () => startTransition(() => setSettled(structuredClone(form.getValues())));
    const unsubscribe = form.subscribe({
      formState: { values: true },
      callback: () => {
        clearTimeout(timer);
        timer = setTimeout(settle, TYPING_PAUSE_MS);
      },
    });
    // what was set between the first drawing and now
    settle();
    return () => {
      clearTimeout(timer);
      unsubscribe();
    };
  }, [form]);
  return settled;
}
