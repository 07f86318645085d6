import { chakra } from '@chakra-ui/react';
import { FEATURE_KIND_LABELS, ROUTE_KIND_LABELS } from '@proofplate/recipe-model';
import { type UseFormReturn, useController } from 'react-hook-form';
import { NumberField, SelectField, TextAreaField, TextField } from '../../../components/field';
import { Panel } from '../../../components/page';
import { formatDate } from '../../../lib/format';
import { useSession } from '../../../lib/session';
import { type Revision, useCalibrations } from '../recipes.api';
import type { DraftValues } from './draft-values';
import type { FieldMessages } from './read-draft';

type Editing = { form: UseFormReturn<DraftValues>; messages: FieldMessages; revision: Revision };

/** Why the change, how it was come by, from when and until when it holds. */
export function ReasonFields({ form, messages, revision }: Editing) {
  const { member } = useSession();
  const route = form.watch('route');
  const isLead = member.role === 'lead' || member.role === 'owner';
  return (
    <Panel px="5" py="4" aria-label="Reason and route">
      <chakra.h2 mb="3">Reason and route</chakra.h2>
      <chakra.div display="grid" gap="4">
        <TextAreaField
          label="Reason for the change"
          help="The signer reads it first."
          error={messages.reason}
          {...form.register('reason')}
        />
        <SelectField
          label="How the setting was come by"
          options={Object.entries(ROUTE_KIND_LABELS).map(([value, label]) => ({ value, label }))}
          error={messages.route}
          {...form.register('route')}
        />
        {(route !== 'coupons' || revision.grounds !== '') && (
          <TextAreaField
            label="Written grounds of a lead"
            help={
              isLead
                ? 'Why it may be used although it was not proved on coupons. They show wherever the setting shows.'
                : 'A lead writes them in this draft.'
            }
            readOnly={!isLead}
            error={messages.grounds}
            {...form.register('grounds')}
          />
        )}
        <PowerTableField form={form} messages={messages} revision={revision} />
        <Pair>
          <TextField
            label="Takes effect on"
            type="date"
            isOptional
            help="Without a day: with its approval."
            error={messages.effectiveFrom}
            {...form.register('effectiveFrom')}
          />
          <TextField
            label="Re-prove by"
            type="date"
            isOptional
            help="Without a day: by the shop’s policy."
            error={messages.reviewDue}
            {...form.register('reviewDue')}
          />
        </Pair>
      </chakra.div>
    </Panel>
  );
}

/** Controlled: the tables arrive after the page, and an option that is not there yet cannot be chosen by the form. */
function PowerTableField({ form, messages, revision }: Editing) {
  const { shop } = useSession();
  const tables = useCalibrations(revision.recipe.machine.id).data?.items ?? [];
  const cited = revision.calibration;
  const isCitedMissing = cited !== null && !tables.some(({ id }) => id === cited.id);
  const { field } = useController({ control: form.control, name: 'calibrationId' });
  return (
    <SelectField
      label="Power table"
      help="The watts at the work come from it."
      placeholder="none cited"
      options={[...(isCitedMissing ? [cited] : []), ...tables].map(({ id, measuredOn, meter }) => ({
        value: id,
        label: `${formatDate(measuredOn, shop.timeZone)}, ${meter}`,
      }))}
      error={messages.calibrationId}
      {...field}
    />
  );
}

/** What the recipe covers beyond its five keys, and the limits of use; both are signed with the setting. */
export function CoverFields({ form, messages }: Omit<Editing, 'revision'>) {
  return (
    <Panel px="5" py="4" aria-label="What it covers">
      <chakra.h2 mb="1">What it covers</chakra.h2>
      <chakra.p fontSize="sm" color="fg.muted" mb="3">
        Signed with the setting. Two approved recipes never cover the same work.
      </chakra.p>
      <chakra.div display="grid" gap="4">
        <SelectField
          label="Kind of feature"
          placeholder="any"
          options={Object.entries(FEATURE_KIND_LABELS).map(([value, label]) => ({ value, label }))}
          {...form.register('scope.featureKind')}
        />
        <RangeFields form={form} messages={messages} name="scope.featureSizeMm" label="Feature size" />
        <RangeFields form={form} messages={messages} name="scope.thicknessMm" label="Thickness of the part" />
        <RangeFields form={form} messages={messages} name="scope.partDiameterMm" label="Part diameter" />
        <TextField label="Customer specification" isOptional {...form.register('scope.customerSpecification')} />
        <h3>Limits of use</h3>
        <RangeFields form={form} messages={messages} name="limits.thicknessMm" label="Use for thickness" />
        <RangeFields form={form} messages={messages} name="limits.partDiameterMm" label="Use for diameter" />
        <TextAreaField label="Limits in words" isOptional error={messages['limits.notes']} {...form.register('limits.notes')} />
      </chakra.div>
    </Panel>
  );
}

type RangeName = 'scope.thicknessMm' | 'scope.partDiameterMm' | 'scope.featureSizeMm' | 'limits.thicknessMm' | 'limits.partDiameterMm';

function RangeFields({ form, messages, name, label }: Omit<Editing, 'revision'> & { name: RangeName; label: string }) {
  return (
    <Pair>
      <NumberField label={`${label} from`} unit="mm" isOptional error={messages[`${name}.from`]} {...form.register(`${name}.from`)} />
      <NumberField label={`${label} to`} unit="mm" isOptional error={messages[`${name}.to`]} {...form.register(`${name}.to`)} />
    </Pair>
  );
}

function Pair({ children }: { children: React.ReactNode }) {
  return (
    <chakra.div display="grid" gap="4" gridTemplateColumns={{ base: 'minmax(0, 1fr)', sm: 'repeat(2, minmax(0, 1fr))' }} alignItems="start">
      {children}
    </chakra.div>
  );
}
