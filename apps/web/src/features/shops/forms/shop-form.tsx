import { Button } from '../../../components/button';
import { SelectField, TextField } from '../../../components/field';
import { Form, useSummaryForm } from '../../../components/form';
import { useStatusLine } from '../../../components/status-line';
import { NUMBER_STYLE_OPTIONS, UNIT_SYSTEM_OPTIONS, withOwnValue, zoneOptions } from '../../../lib/shop-options';
import { LONGEST_NAME, textRules } from '../../../lib/text-rules';
import { changeShop, type Shop } from '../shops.api';

const LABELS = { name: 'Name of the shop', unitSystem: 'Units', locale: 'Numbers are written', timeZone: 'Time zone' };
type Values = Pick<Shop, 'name' | 'unitSystem' | 'locale' | 'timeZone'>;

export function ShopForm({ shop }: { shop: Shop }) {
  const { name, unitSystem, locale, timeZone } = shop;
  const form = useSummaryForm<Values>({ defaultValues: { name, unitSystem, locale, timeZone } });
  const announce = useStatusLine();
  const { errors, isSubmitting } = form.formState;
  const submit = async (values: Values) => {
    await changeShop(shop, values);
    announce('The shop is saved.');
  };
  return (
    <Form form={form} labels={LABELS} onSubmit={submit}>
      <TextField
        label={LABELS.name}
        help="Stands on every set-up sheet."
        error={errors.name?.message}
        {...form.register('name', textRules('Enter the name that stands on set-up sheets', LONGEST_NAME))}
      />
      <SelectField
        label={LABELS.unitSystem}
        help="Lengths of lenses, materials and coupons are typed and read in it; a length with its unit (“25.4 mm”) is taken in either. Settings stay in the units of each machine’s panel; spots in µm, optics of a machine, limits of use and marking time in mm. Round parts have a choice of their own."
        options={UNIT_SYSTEM_OPTIONS}
        error={errors.unitSystem?.message}
        {...form.register('unitSystem')}
      />
      <SelectField
        label={LABELS.locale}
        options={withOwnValue(NUMBER_STYLE_OPTIONS, locale)}
        error={errors.locale?.message}
        {...form.register('locale')}
      />
      <SelectField
        label={LABELS.timeZone}
        help="Signatures carry the local time with this zone."
        options={withOwnValue(zoneOptions(), timeZone)}
        error={errors.timeZone?.message}
        {...form.register('timeZone')}
      />
      <Button type="submit" kind="primary" size="touch" isBusy={isSubmitting}>
        Save the shop
      </Button>
    </Form>
  );
}
