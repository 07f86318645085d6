import { chakra } from '@chakra-ui/react';
import { PARAMETERS } from '@proofplate/recipe-model';
import { useRef, useState } from 'react';
import { useWatch } from 'react-hook-form';
import { ActBar } from '../../../components/act-bar';
import { Button } from '../../../components/button';
import { EmptyState } from '../../../components/empty-state';
import { NumberField, SelectField, TextField } from '../../../components/field';
import { Form, messageAt, useSummaryForm } from '../../../components/form';
import { SkeletonForm } from '../../../components/skeletons';
import { ProblemError } from '../../../lib/api';
import { shopLengthUnit } from '../../../lib/format';
import {
  type Choice,
  type Coupon,
  type ImportBody,
  type ImportPreview,
  importCoupon,
  previewImport,
  useGroundChoices,
  useLensChoices,
  useMachineChoices,
} from '../coupons.api';
import { CircumstanceFields, CommonFields, SquaresFields } from './import-fields';
import { ImportResult } from './import-result';
import { emptyImport, type ImportValues, importBody } from './import-values';

const optionsOf = (choices: readonly Choice[]) => choices.map(({ id, name }) => ({ value: id, label: name }));

export type ImportCouponProps = { locale: string; onImported: (coupon: Coupon) => void };
type Looked = { text: string; body: ImportBody; preview: ImportPreview };

/** A plate from the drawer: look at what will be entered, then enter it. */
export function ImportCoupon({ locale, onImported }: ImportCouponProps) {
  const form = useSummaryForm<ImportValues>({ defaultValues: emptyImport() });
  const frame = useRef<HTMLDivElement>(null);
  const [looked, setLooked] = useState<Looked>();
  const values = useWatch({ control: form.control }) as ImportValues;
  const machines = useMachineChoices().data?.items;
  const lenses = useLensChoices(values.machineId).data?.items ?? [];
  const { materials, finishes, effects } = useGroundChoices();
  const panel = machines?.find(({ id }) => id === values.machineId)?.profile.panel;
  // what was looked at is entered; a change afterwards is looked at again first
  const isCurrent = looked !== undefined && looked.text === JSON.stringify(values);
  const handleSubmit = async (typed: ImportValues, { idempotencyKey }: { idempotencyKey: string }) => {
    if (isCurrent && looked !== undefined) {
      const leaveOutRefusedRows = looked.preview.refusedRows.length > 0;
      onImported(await importCoupon({ ...looked.body, leaveOutRefusedRows }, idempotencyKey));
      return;
    }
    const read = importBody(typed, panel, locale);
    if ('messages' in read) throw unreadable(read.messages);
    setLooked({ text: JSON.stringify(typed), body: read.body, preview: await previewImport(read.body) });
  };
  if (machines === undefined || materials === undefined || finishes === undefined || effects === undefined)
    return <SkeletonForm fields={8} />;
  const at = (name: string) => messageAt(form.formState.errors, name);
  const choose = { placeholder: 'Choose' };
  return (
    <chakra.div
      display="grid"
      gridTemplateColumns={{ base: 'minmax(0, 1fr)', lg: '400px minmax(0, 1fr)' }}
      gap={{ base: '6', lg: '8' }}
      alignItems="start"
    >
      <div ref={frame}>
        <Form form={form} labels={LABELS} onSubmit={handleSubmit}>
          <chakra.div display="grid" gridTemplateColumns="repeat(2, minmax(0, 1fr))" gap="2" rowGap="3" alignItems="start">
            <SelectField
              label="Machine"
              {...choose}
              {...form.register('machineId')}
              error={at('machineId')}
              options={optionsOf(machines)}
            />
            <SelectField
              label="Lens"
              {...choose}
              {...form.register('lensId')}
              error={at('lensId')}
              options={lenses.map(({ lensId, lensName }) => ({ value: lensId, label: lensName }))}
            />
            <SelectField
              label="Material"
              {...choose}
              {...form.register('materialId')}
              error={at('materialId')}
              options={optionsOf(materials)}
            />
            <SelectField label="Finish" {...choose} {...form.register('finishId')} error={at('finishId')} options={optionsOf(finishes)} />
            <SelectField label="Effect" {...choose} {...form.register('effectId')} error={at('effectId')} options={optionsOf(effects)} />
            <NumberField label="Thickness" unit={shopLengthUnit()} isOptional {...form.register('thicknessMm')} error={at('thicknessMm')} />
            <TextField label="Lot" isOptional {...form.register('lot')} error={at('lot')} />
            <TextField label="What it is for" isOptional {...form.register('title')} error={at('title')} />
          </chakra.div>
          {panel !== undefined && (
            <>
              <SquaresFields form={form} panel={panel} />
              <CommonFields form={form} panel={panel} />
            </>
          )}
          <CircumstanceFields form={form} />
        </Form>
      </div>
      <chakra.section aria-label="What will be entered" position={{ lg: 'sticky' }} top={{ lg: '6' }} display="grid" gap="4" minW="0">
        {looked === undefined ? (
          <EmptyState kind="none-match" title="Nothing is entered yet">
            The plate enters as marked. What nobody knows any more stays empty, is marked as unknown, and is never filled in.
          </EmptyState>
        ) : (
          <ImportResult preview={looked.preview} />
        )}
        <ActBar>
          <Button
            kind="primary"
            size="touch"
            isBusy={form.formState.isSubmitting}
            onClick={() => frame.current?.querySelector('form')?.requestSubmit()}
          >
            {isCurrent ? enterWords(looked.preview) : 'Look at what will be entered'}
          </Button>
        </ActBar>
      </chakra.section>
    </chakra.div>
  );
}

const enterWords = ({ refusedRows }: ImportPreview) =>
  refusedRows.length === 0 ? 'Enter the plate' : `Enter it without ${refusedRows.length} refused`;

const parameterLabels = Object.fromEntries(Object.entries(PARAMETERS).map(([key, { label }]) => [`common.${key}`, label]));
const LABELS = {
  ...{ machineId: 'Machine', lensId: 'Lens', materialId: 'Material', finishId: 'Finish', effectId: 'Effect', thicknessMm: 'Thickness' },
  ...{ lot: 'Lot', title: 'What it is for', 'grid.rows': 'Rows', 'grid.columns': 'Columns', table: 'Rows from the spreadsheet' },
  ...{ 'grid.rowFactor.levels': 'Levels, top to bottom', 'grid.columnFactor.levels': 'Levels, left to right' },
  ...{
    'grid.columnFactor.parameter': 'Varies across the columns',
    cellMm: 'Cell',
    gapMm: 'Gap',
    markedOn: 'Marked on',
    storedAt: 'Kept at',
  },
  ...parameterLabels,
};

/** What the fields say by themselves, in the form in which the server says it. */
function unreadable(messages: readonly { name: string; message: string }[]): ProblemError {
  const errors = messages.map(({ name, message }) => ({ pointer: `#/${name.replaceAll('.', '/')}`, detail: message }));
  const title = 'Some fields need another look';
  return new ProblemError({ type: '/problems/invalid-fields', code: 'invalid-fields', title, detail: title, status: 422, errors });
}
