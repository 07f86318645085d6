import { chakra } from '@chakra-ui/react';
import { PANEL_UNITS } from '@proofplate/physics';
import { ASSIST_LABELS, FILL_LABELS, type Panel } from '@proofplate/recipe-model';
import { type UseFormReturn, useWatch } from 'react-hook-form';
import { NumberField, SelectField, TextAreaField, TextField } from '../../../components/field';
import { messageAt } from '../../../components/form';
import { Panel as Card } from '../../../components/page';
import { Segmented } from '../../../components/segmented';
import { Switch } from '../../../components/switch';
import { shopLengthUnit } from '../../../lib/format';
import type { ImportValues } from './import-values';

const NOT_KNOWN = { value: '', label: 'Not known' };
const optionsOf = (labels: Readonly<Record<string, string>>) => [
  NOT_KNOWN,
  ...Object.entries(labels).map(([value, label]) => ({ value, label })),
];
const FROM = [
  { value: 'grid', label: 'A grid' },
  { value: 'table', label: 'A pasted table' },
] as const;
const TWO = { display: 'grid', gridTemplateColumns: 'repeat(2, minmax(0, 1fr))', gap: '2', rowGap: '3', alignItems: 'start' } as const;

type FieldsProps = { form: UseFormReturn<ImportValues>; panel: Panel };

/** The squares: a grid with whatever levels are known, or rows of a spreadsheet. */
export function SquaresFields({ form, panel }: FieldsProps) {
  const from = useWatch({ control: form.control, name: 'from' });
  return (
    <Card p="4" display="grid" gap="3" aria-label="Squares on the plate">
      <Segmented label="Where the settings come from" choices={FROM} value={from} onChange={(next) => form.setValue('from', next)} isWide />
      {from === 'grid' ? <GridFields form={form} panel={panel} /> : <TableField form={form} />}
    </Card>
  );
}

function GridFields({ form, panel }: FieldsProps) {
  const at = (name: string) => messageAt(form.formState.errors, name);
  const [down, across] = useWatch({ control: form.control, name: ['grid.rowFactor.parameter', 'grid.columnFactor.parameter'] });
  const options = [NOT_KNOWN, ...panel.fields.map(({ parameter, label }) => ({ value: parameter, label }))];
  return (
    <chakra.div {...TWO}>
      <NumberField label="Rows" {...form.register('grid.rows')} error={at('grid.rows')} />
      <NumberField label="Columns" {...form.register('grid.columns')} error={at('grid.columns')} />
      <SelectField
        label="Varies down the rows"
        {...form.register('grid.rowFactor.parameter')}
        options={options}
        error={at('grid.rowFactor.parameter')}
      />
      <SelectField
        label="Varies across the columns"
        {...form.register('grid.columnFactor.parameter')}
        options={options}
        error={at('grid.columnFactor.parameter')}
      />
      {down === '' ? (
        <span />
      ) : (
        <TextField
          label="Levels, top to bottom"
          {...form.register('grid.rowFactor.levels')}
          error={at('grid.rowFactor.levels')}
          help="100 140 190 …"
        />
      )}
      {across !== '' && (
        <TextField
          label="Levels, left to right"
          {...form.register('grid.columnFactor.levels')}
          error={at('grid.columnFactor.levels')}
          help="15 20 25 …"
        />
      )}
    </chakra.div>
  );
}

function TableField({ form }: { form: UseFormReturn<ImportValues> }) {
  return (
    <TextAreaField
      label="Rows from the spreadsheet"
      rows={8}
      help="Headings first, such as Cell, Speed (mm/s), Power (%), Note. Rows without a cell are laid out in their order."
      {...form.register('table')}
      error={messageAt(form.formState.errors, 'table')}
    />
  );
}

/** What was the same in every square, as far as anybody remembers. */
export function CommonFields({ form, panel }: FieldsProps) {
  const [from, down, across] = useWatch({
    control: form.control,
    name: ['from', 'grid.rowFactor.parameter', 'grid.columnFactor.parameter'],
  });
  const varied = from === 'grid' ? [down, across] : [];
  return (
    <Card p="4" display="grid" gap="3" aria-labelledby="import-common">
      <chakra.div>
        <chakra.h2 id="import-common" fontSize="md" lineHeight="md">
          The same in every square
        </chakra.h2>
        <chakra.p fontSize="sm" lineHeight="sm" color="fg.muted">
          Leave empty what nobody knows. It stays unknown.
        </chakra.p>
      </chakra.div>
      <chakra.div {...TWO}>
        {panel.fields
          .filter(({ parameter }) => !varied.includes(parameter))
          .map(({ parameter, label, unit }) => (
            <NumberField
              key={parameter}
              label={label}
              unit={PANEL_UNITS[unit].symbol}
              {...form.register(`common.${parameter}`)}
              error={messageAt(form.formState.errors, `common.${parameter}`)}
            />
          ))}
        <SelectField label="Fill" {...form.register('fill')} options={optionsOf(FILL_LABELS)} />
        <SelectField label="Assist" {...form.register('assist')} options={optionsOf(ASSIST_LABELS)} />
        <NumberField label="Cell" unit={shopLengthUnit()} {...form.register('cellMm')} error={messageAt(form.formState.errors, 'cellMm')} />
        <NumberField label="Gap" unit={shopLengthUnit()} {...form.register('gapMm')} error={messageAt(form.formState.errors, 'gapMm')} />
      </chakra.div>
    </Card>
  );
}

/** When, by whom, and whether the machine is still the one it was. */
export function CircumstanceFields({ form }: { form: UseFormReturn<ImportValues> }) {
  const [byMe, isUnchanged] = useWatch({ control: form.control, name: ['markedByMe', 'isMachineUnchanged'] });
  return (
    <>
      <chakra.div {...TWO}>
        <TextField
          type="date"
          label="Marked on"
          isOptional
          {...form.register('markedOn')}
          error={messageAt(form.formState.errors, 'markedOn')}
        />
        <TextField label="Kept at" isOptional {...form.register('storedAt')} error={messageAt(form.formState.errors, 'storedAt')} />
      </chakra.div>
      <Switch label="I marked it" isOn={byMe} onChange={(isOn) => form.setValue('markedByMe', isOn)} />
      <Switch
        label="The machine is unchanged since"
        isOn={isUnchanged}
        onChange={(isOn) => form.setValue('isMachineUnchanged', isOn)}
        help="Only when source and scan head are still the same. Otherwise that stays unknown."
      />
    </>
  );
}
