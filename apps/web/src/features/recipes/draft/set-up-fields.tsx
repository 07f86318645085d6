import { chakra, Flex } from '@chakra-ui/react';
import { type UseFormReturn, useFieldArray } from 'react-hook-form';
import { Button } from '../../../components/button';
import { Checkbox } from '../../../components/facets';
import { TextField } from '../../../components/field';
import { PlusIcon } from '../../../components/icons';
import { Panel } from '../../../components/page';
import type { DraftValues } from './draft-values';
import { MoveButtons } from './move-buttons';
import type { FieldMessages } from './read-draft';

const MOST_STEPS = 50;

/** What is done before marking, in its order; the order is changed by buttons. */
export function SetUpFields({ form, messages }: { form: UseFormReturn<DraftValues>; messages: FieldMessages }) {
  const { fields, append, remove, swap } = useFieldArray({ control: form.control, name: 'setUpSteps' });
  return (
    <Panel px="5" py="4" aria-label="Set-up steps">
      <chakra.h2 mb="2">Set-up steps</chakra.h2>
      <chakra.ol display="grid" gap="3">
        {fields.map((field, index) => {
          const name = `setUpSteps.${index}` as const;
          return (
            <chakra.li key={field.id} borderTop="hairline" pt="3" _first={{ borderTop: 'none', pt: '0' }}>
              <TextField label={`Set-up step ${index + 1}`} error={messages[`${name}.text`]} {...form.register(`${name}.text`)} />
              <chakra.div mt="2">
                <TextField label="Caution beside it" isOptional {...form.register(`${name}.caution`)} />
              </chakra.div>
              <Flex justify="space-between" align="center" gap="3" wrap="wrap" mt="1">
                <chakra.label htmlFor={`${field.id}-tick`} display="flex" gap="2" alignItems="center" minHeight="44px" cursor="pointer">
                  <Checkbox id={`${field.id}-tick`} {...form.register(`${name}.mustTick`)} />
                  Must be ticked before a run starts
                </chakra.label>
                <Flex gap="1">
                  <MoveButtons
                    what={`set-up step ${index + 1}`}
                    isFirst={index === 0}
                    isLast={index === fields.length - 1}
                    onMove={(by) => swap(index, index + by)}
                  />
                  <Button kind="quiet" aria-label={`Take out set-up step ${index + 1}`} onClick={() => remove(index)}>
                    Take out
                  </Button>
                </Flex>
              </Flex>
            </chakra.li>
          );
        })}
      </chakra.ol>
      <chakra.div mt="3">
        <Button
          icon={<PlusIcon />}
          disabled={fields.length >= MOST_STEPS}
          onClick={() => append({ text: '', caution: '', mustTick: true, photoId: '' })}
        >
          Add a set-up step
        </Button>
      </chakra.div>
    </Panel>
  );
}
