import { chakra } from '@chakra-ui/react';
import { useSession } from '../../../lib/session';
import { PanelPreview } from '../components/panel-preview';
import { panelField } from './machine-body';
import { MachineForm, type MachineFormProps } from './machine-form';

/** The form with the setting card that its panel makes beside it, as it is typed. */
export function MachineFormWithPreview(props: MachineFormProps) {
  const { locale } = useSession().shop;
  const fields = props.form.watch('panel.fields').flatMap((row) => panelField(row, locale) ?? []);
  return (
    <chakra.div
      display="grid"
      gap="8"
      gridTemplateColumns={{ base: 'minmax(0, 1fr)', xl: 'minmax(0, 480px) minmax(0, 1fr)' }}
      alignItems="start"
    >
      <MachineForm {...props} />
      <chakra.section aria-labelledby="preview-title" position={{ xl: 'sticky' }} top="6" maxW="640px">
        <chakra.h2 id="preview-title" mb="2">
          As a setting card
        </chakra.h2>
        <PanelPreview panel={{ fields }} />
      </chakra.section>
    </chakra.div>
  );
}
