import { chakra } from '@chakra-ui/react';
import type { ReactNode } from 'react';
import { ActBar } from '../../../components/act-bar';
import { Button } from '../../../components/button';
import { TextField } from '../../../components/field';
import { Form, messageAt, useSummaryForm } from '../../../components/form';
import { formatCount } from '../../../lib/format';
import { type Coupon, finishMarking } from '../coupons.api';

type FinishValues = { storedAt: string; ambientNotes: string };
const LABELS = { storedAt: 'Kept at', ambientNotes: 'Room and circumstances' };

export type FinishMarkingProps = {
  coupon: Coupon;
  clock: ReactNode;
  onFinished: (coupon: Coupon) => void;
  onUndo: (() => void) | undefined;
};

/** Every cell has its word: the plate is marked from now on, with who and when. */
export function FinishMarking({ coupon, clock, onFinished, onUndo }: FinishMarkingProps) {
  const form = useSummaryForm<FinishValues>({ defaultValues: { storedAt: coupon.storedAt, ambientNotes: coupon.ambientNotes } });
  const count = (state: string) => coupon.cells.filter(({ markState }) => markState === state).length;
  const skipped = coupon.cells.filter(({ markState }) => markState === 'skipped');
  return (
    <>
      <chakra.div mb="4">{clock}</chakra.div>
      <Form
        form={form}
        labels={LABELS}
        onSubmit={async (values, { idempotencyKey }) => onFinished(await finishMarking(coupon, values, idempotencyKey))}
      >
        <chakra.p>
          {formatCount(count('marked'), 'cell')} as planned, {count('differs')} with other values, {count('skipped')} skipped
          {skipped.length > 0 && ` (${skipped.map(({ address, markNote }) => `${address}: ${markNote}`).join('; ')})`}.
        </chakra.p>
        <TextField
          size="glove"
          label={LABELS.storedAt}
          isOptional
          {...form.register('storedAt')}
          error={messageAt(form.formState.errors, 'storedAt')}
        />
        <TextField
          size="glove"
          label={LABELS.ambientNotes}
          isOptional
          {...form.register('ambientNotes')}
          error={messageAt(form.formState.errors, 'ambientNotes')}
        />
        <ActBar>
          <Button size="glove" disabled={onUndo === undefined} onClick={onUndo}>
            Undo the last
          </Button>
          <Button kind="primary" size="primaryAct" type="submit" isBusy={form.formState.isSubmitting}>
            The plate is marked
          </Button>
        </ActBar>
      </Form>
    </>
  );
}
