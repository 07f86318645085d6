import { chakra } from '@chakra-ui/react';
import type { UseFormRegisterReturn } from 'react-hook-form';
import { Checkbox } from '../../../components/facets';
import { fieldId } from '../../../components/field';
import { StateShape } from '../../../components/state-mark';

export type CautionTicksProps = {
  cautions: readonly { id: string; subject: string; text: string; source: string }[];
  registration: UseFormRegisterReturn;
  error: string | undefined;
};

/** Each caution is read and ticked for itself. */
export function CautionTicks({ cautions, registration, error }: CautionTicksProps) {
  if (cautions.length === 0) return null;
  return (
    <chakra.fieldset minW="0" p="3" bg="straw.subtle" border="hairline" borderColor="straw.emphasized" borderRadius="md">
      <chakra.legend srOnly>Cautions that you acknowledge</chakra.legend>
      {cautions.map(({ id, subject, text, source }, index) => (
        <chakra.label
          key={id}
          htmlFor={index === 0 ? fieldId(registration.name) : `caution-${id}`}
          display="grid"
          gridTemplateColumns="30px minmax(0, 1fr)"
          py="1.5"
          cursor="pointer"
          fontSize="sm"
          lineHeight="sm"
        >
          <Checkbox id={index === 0 ? fieldId(registration.name) : `caution-${id}`} value={id} {...registration} />
          <span>
            <b>{subject}</b> {text} <chakra.span color="fg.muted">{source}</chakra.span>
          </span>
        </chakra.label>
      ))}
      {error !== undefined && (
        <chakra.p display="flex" gap="1.5" alignItems="center" fontSize="sm" color="oxide.fg">
          <StateShape state="fails" />
          {error}
        </chakra.p>
      )}
    </chakra.fieldset>
  );
}
