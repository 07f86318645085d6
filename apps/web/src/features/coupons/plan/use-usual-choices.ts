import type { Panel } from '@proofplate/recipe-model';
import { useEffect } from 'react';
import type { UseFormReturn } from 'react-hook-form';
import type { MachineLens } from '../coupons.api';
import { factorsFor, type PlanValues } from './plan-values';

/** Fills in what is usual as soon as the machine says it, and never over what somebody chose. */
export function useUsualChoices(form: UseFormReturn<PlanValues>, panel: Panel | undefined, lenses: readonly MachineLens[]): void {
  useEffect(() => {
    if (panel === undefined) return;
    const [columns, rows] = [form.getValues('columns.parameter'), form.getValues('rows.parameter')];
    const usual = factorsFor(panel, form.getValues());
    if (columns !== usual.columns) form.setValue('columns.parameter', usual.columns);
    // no rows beside chosen columns are somebody's choice: one row
    const isChosen = rows === '' && (columns !== '' || form.formState.dirtyFields.rows !== undefined);
    if (rows !== usual.rows && !isChosen) form.setValue('rows.parameter', usual.rows);
  }, [panel, form]);
  useEffect(() => {
    if (lenses.length === 0) return;
    const [only] = lenses;
    const usual = lenses.find(({ isMounted }) => isMounted) ?? (lenses.length === 1 ? only : undefined);
    const chosen = form.getValues('lensId');
    // a chosen lens is set again: the field had no such option before its lenses were read
    const next = chosen === '' ? usual?.lensId : chosen;
    if (next !== undefined) form.setValue('lensId', next);
  }, [lenses, form]);
}
