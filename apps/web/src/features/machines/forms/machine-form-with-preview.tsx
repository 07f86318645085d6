import { chakra } from '@chakra-ui/react';
import { type Control, useWatch } from 'react-hook-form';
import { useSession } from '../../../lib/session';
import { PanelPreview } from '../components/panel-preview';
import { panelField } from './machine-body';
import { MachineForm, type MachineFormProps } from './machine-form';
import type { MachineValues } from './machine-values';

/** The form with the setting card that its panel makes beside it, as it is typed. */
export function MachineFormWithPreview(props: MachineFormProps) {
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
        <LivePreview control={props.form.control} />
      </chakra.section>
    </chakra.div>
  );
}

/** Listens on its own, so that a key pressed in the form draws this card and not the whole form. */
function LivePreview({ control }: { control: Control<MachineValues> }) {
  const { locale } = useSession().shop;
  const rows = useWatch({ control, name: 'panel.fields' });
  return <PanelPreview panel={{ fields: rows.flatMap((row) => panelField(row, locale) ?? []) }} />;
}
