import { chakra } from '@chakra-ui/react';
import type { Panel } from '@proofplate/recipe-model';
import { memo, type ReactNode } from 'react';
import { type UseFormReturn, useFormState, useWatch } from 'react-hook-form';
import { Button } from '../../../components/button';
import { NumberField } from '../../../components/field';
import { Form, messageAt } from '../../../components/form';
import { Panel as Card } from '../../../components/page';
import { Segmented } from '../../../components/segmented';
import { SkeletonForm } from '../../../components/skeletons';
import { Switch } from '../../../components/switch';
import { shopLengthUnit } from '../../../lib/format';
import type { CouponPreview, ShopCaution } from '../coupons.api';
import { FactorFields } from './factor-fields';
import { type GroundChoices, GroundFields } from './ground-fields';
import { labelsOf } from './plan-labels';
import { newSeed, type PlanValues } from './plan-values';
import { SettingFields } from './setting-fields';

const DRAWN_BY = [
  { value: 'machine', label: 'The machine' },
  { value: 'artwork', label: 'The artwork' },
] as const;

export type PlanFormProps = {
  form: UseFormReturn<PlanValues>;
  choices: GroundChoices;
  /** Panel of the chosen machine; undefined until one is chosen. */
  panel: Panel | undefined;
  isMachineChosen: boolean;
  /** Cautions that forbid the work that is chosen: the fields behind them are not asked for. */
  never: readonly ShopCaution[];
  rowFactor: CouponPreview['rowFactor'] | undefined;
  columnFactor: CouponPreview['columnFactor'] | undefined;
  /** What follows from what is typed, under the fields of the setting. */
  numbers: ReactNode;
  onSubmit: (values: PlanValues, submit: { idempotencyKey: string }) => Promise<unknown>;
};

/** The left half of the plan: what is typed. An answer of the server that changes nothing in it does not draw its fields again. */
export const PlanForm = memo(PlanFields);

function PlanFields({ form, choices, panel, isMachineChosen, never, rowFactor, columnFactor, numbers, onSubmit }: PlanFormProps) {
  const [rows, columns] = useWatch({ control: form.control, name: ['rows.parameter', 'columns.parameter'] });
  return (
    <Form form={form} labels={labelsOf(panel)} onSubmit={onSubmit}>
      <GroundFields form={form} choices={choices} never={never} />
      {never.length > 0 ? (
        <chakra.p color="fg.muted">
          The rest of the plan is not asked for: this work must not be marked. What you typed there is kept.
        </chakra.p>
      ) : panel === undefined ? (
        isMachineChosen && <SkeletonForm fields={6} />
      ) : (
        <>
          <FactorFields form={form} name="rows" panel={panel} stored={rowFactor} />
          <FactorFields form={form} name="columns" panel={panel} stored={columnFactor} />
          <Card p="4" display="grid" gap="3" aria-labelledby="plan-base">
            <chakra.h2 id="plan-base" fontSize="md" lineHeight="md">
              The same in every cell
            </chakra.h2>
            <SettingFields form={form} name="base" panel={panel} varied={[rows, columns]} />
          </Card>
          {numbers}
          <LabelStepFields form={form} panel={panel} />
          <PlateFields form={form} />
        </>
      )}
    </Form>
  );
}

function LabelStepFields({ form, panel }: { form: UseFormReturn<PlanValues>; panel: Panel }) {
  const hasLabelStep = useWatch({ control: form.control, name: 'hasLabelStep' });
  return (
    <Card p="4" display="grid" gap="3" aria-label="Corner marks and letters">
      <Switch
        label="Mark corner marks and letters"
        isOn={hasLabelStep}
        onChange={(isOn) => form.setValue('hasLabelStep', isOn, { shouldDirty: true })}
        help="They are burnt first, with a setting of their own. Prove it on a scrap edge: they must be read in every photo."
      />
      {hasLabelStep && <SettingFields form={form} name="labelStep" panel={panel} />}
    </Card>
  );
}

function PlateFields({ form }: { form: UseFormReturn<PlanValues> }) {
  const [isRandom, seed, drawnBy] = useWatch({ control: form.control, name: ['isRandom', 'runOrderSeed', 'fillDrawnBy'] });
  const { errors } = useFormState({ control: form.control });
  const at = (name: string) => messageAt(errors, name);
  return (
    <>
      <Card p="4" display="grid" gap="3" aria-label="Plate">
        <chakra.div display="grid" gridTemplateColumns="repeat(2, minmax(0, 1fr))" gap="2" rowGap="3" alignItems="start">
          <NumberField label="Cell" unit={shopLengthUnit()} {...form.register('cellMm')} error={at('cellMm')} />
          <NumberField label="Gap" unit={shopLengthUnit()} {...form.register('gapMm')} error={at('gapMm')} />
        </chakra.div>
        <div>
          <chakra.div fontWeight="semibold" fontSize="sm" lineHeight="sm" mb="1">
            Who draws the fill lines
          </chakra.div>
          <Segmented
            label="Who draws the fill lines"
            choices={DRAWN_BY}
            value={drawnBy}
            onChange={(next) => form.setValue('fillDrawnBy', next, { shouldDirty: true })}
            isWide
          />
        </div>
        <NumberField
          label="Flag cells from a dose of"
          unit="J/mm²"
          isOptional
          help="Empty: the lowest dose that went wrong on this material and finish before."
          {...form.register('doseCautionJPerMm2')}
          error={at('doseCautionJPerMm2')}
        />
      </Card>
      <chakra.div display="flex" justifyContent="space-between" alignItems="flex-start" gap="3">
        <Switch
          label="Random run order"
          isOn={isRandom}
          onChange={(isOn) => form.setValue('isRandom', isOn, { shouldDirty: true })}
          help={isRandom ? `keeps heat build-up out of the result; seed ${seed}` : 'row by row: heat build-up looks like an effect'}
        />
        {isRandom && (
          <Button kind="quiet" onClick={() => form.setValue('runOrderSeed', newSeed(), { shouldDirty: true })}>
            Shuffle
          </Button>
        )}
      </chakra.div>
    </>
  );
}
