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

/** Each caution is ticked for itself; its act shows, its reason and source open beside the tick. */
export function CautionTicks({ cautions, registration, error }: CautionTicksProps) {
  if (cautions.length === 0) return null;
  return (
    <chakra.fieldset minW="0" p="3" bg="straw.subtle" border="hairline" borderColor="straw.emphasized" borderRadius="md">
      <chakra.legend srOnly>Cautions that you acknowledge</chakra.legend>
      {cautions.map(({ id, subject, text, source }, index) => {
        const controlId = index === 0 ? fieldId(registration.name) : `caution-${id}`;
        return (
          <chakra.div key={id} display="grid" gridTemplateColumns="30px minmax(0, 1fr)" py="1" fontSize="sm" lineHeight="sm">
            <chakra.label htmlFor={controlId} pt="1px" minHeight="28px" cursor="pointer">
              <Checkbox id={controlId} value={id} {...registration} />
              <chakra.span srOnly>{subject}</chakra.span>
            </chakra.label>
            <chakra.details>
              <chakra.summary cursor="pointer" fontWeight="semibold">
                {subject}
              </chakra.summary>
              {text} <chakra.span color="fg.muted">{source}</chakra.span>
            </chakra.details>
          </chakra.div>
        );
      })}
      {error !== undefined && (
        <chakra.p display="flex" gap="1.5" alignItems="center" fontSize="sm" color="oxide.fg">
          <StateShape state="fails" />
          {error}
        </chakra.p>
      )}
    </chakra.fieldset>
  );
}
