import { chakra } from '@chakra-ui/react';
import { useNavigate } from 'react-router';
import { Button } from '../../../components/button';
import { Dialog } from '../../../components/dialog';
import { NumberField, TextField } from '../../../components/field';
import { Form, useSummaryForm } from '../../../components/form';
import { paths } from '../../../lib/paths';
import { readNumber } from '../../../lib/read-number';
import { useSession } from '../../../lib/session';
import { planConfirmationCoupon, type Revision } from '../recipes.api';
import type { DraftValues } from './draft-values';

const LABELS = {
  count: 'Equal cells',
  lot: 'Lot of the material',
  thicknessMm: 'Thickness of the plate',
  storedAt: 'Where it will be kept',
};
const COUNT = { what: 'The number of cells', unit: '', least: 1, most: 60, isWhole: true };
const THICKNESS = { what: 'The thickness', unit: 'mm', least: 0.001, most: 1000, isShopLength: true };
const USUAL_COUNT = '5';

export type ProveItDialogProps = {
  revision: Revision;
  acknowledged: DraftValues['acknowledged'];
  /** Saves what is still open; false keeps the coupon from being planned with an old setting. */
  flush: () => Promise<boolean>;
  onClose: () => void;
};

/** Plans a coupon on which every cell carries exactly this setting. */
export function ProveItDialog({ revision, acknowledged, flush, onClose }: ProveItDialogProps) {
  const { shop } = useSession();
  const navigate = useNavigate();
  const form = useSummaryForm({ defaultValues: { count: USUAL_COUNT, lot: '', thicknessMm: '', storedAt: '' } });
  const { errors, isSubmitting } = form.formState;
  const read = (text: string, rule: typeof COUNT | typeof THICKNESS) => readNumber(text, rule, shop.locale);
  const problemOf = (text: string, rule: typeof COUNT | typeof THICKNESS) => {
    const result = read(text, rule);
    return 'message' in result ? result.message : true;
  };
  return (
    <Dialog title="Prove it on a coupon" onClose={onClose}>
      <Form
        form={form}
        labels={LABELS}
        onSubmit={async ({ count, lot, thicknessMm, storedAt }, { idempotencyKey }) => {
          if (!(await flush())) {
            form.setError('count', { message: 'The draft is not saved yet. Close this and mend what it says.' });
            return;
          }
          const cells = read(count, COUNT);
          const thickness = thicknessMm.trim() === '' ? undefined : read(thicknessMm, THICKNESS);
          const coupon = await planConfirmationCoupon(
            {
              revisionId: revision.id,
              count: 'value' in cells ? cells.value : 0,
              acknowledgedCautionIds: [...acknowledged],
              ...(lot.trim() === '' ? {} : { lot: lot.trim() }),
              ...(storedAt.trim() === '' ? {} : { storedAt: storedAt.trim() }),
              ...(thickness !== undefined && 'value' in thickness ? { thicknessMm: thickness.value } : {}),
            },
            idempotencyKey,
          );
          await navigate(paths.coupon(coupon.code));
        }}
      >
        <chakra.p>
          Every cell carries exactly this setting. Mark it later than the basis, better on another lot; rate it, seal it, and cite its cells
          here.
        </chakra.p>
        <NumberField
          label={LABELS.count}
          error={errors.count?.message}
          {...form.register('count', { validate: (text) => problemOf(text, COUNT) })}
        />
        <TextField label={LABELS.lot} isOptional help="Another lot proves more." error={errors.lot?.message} {...form.register('lot')} />
        <NumberField
          label={LABELS.thicknessMm}
          rule={THICKNESS}
          isOptional
          error={errors.thicknessMm?.message}
          {...form.register('thicknessMm', { validate: (text) => text.trim() === '' || problemOf(text, THICKNESS) })}
        />
        <TextField label={LABELS.storedAt} isOptional error={errors.storedAt?.message} {...form.register('storedAt')} />
        <Button type="submit" kind="primary" size="touch" isBusy={isSubmitting}>
          Plan the coupon
        </Button>
      </Form>
    </Dialog>
  );
}
