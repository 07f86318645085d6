import { chakra, Flex } from '@chakra-ui/react';
import { PARAMETER_KEYS, PARAMETERS } from '@proofplate/recipe-model';
import { useRef } from 'react';
import { type UseFormReturn, useFieldArray, useWatch } from 'react-hook-form';
import { Button } from '../../../components/button';
import { fieldId } from '../../../components/field';
import { messageAt } from '../../../components/form';
import { CrossIcon, PlusIcon } from '../../../components/icons';
import { useSession } from '../../../lib/session';
import { type MachineValues, newPanelRow } from './machine-values';
import { PanelRow } from './panel-row';

/** Rows of the panel in its order. A row moves by buttons, so that it works with gloves and with the keyboard. */
export function PanelFields({ form }: { form: UseFormReturn<MachineValues> }) {
  const { locale } = useSession().shop;
  const { fields, append, remove, move } = useFieldArray({
    control: form.control,
    name: 'panel.fields',
    rules: { validate: (rows) => rows.length > 0 || 'Add at least one field that the panel shows.' },
  });
  const list = useRef<HTMLOListElement>(null);
  const taken = useWatch({ control: form.control, name: fields.map((_, index) => `panel.fields.${index}.parameter` as const) });
  const free = PARAMETER_KEYS.find((key) => !taken.includes(key));
  const handleMove = (from: number, to: number) => {
    move(from, to);
    // The pressed button belongs to the row: the focus goes with it, at the end of the list to the row's other button.
    const directions = to < from ? ['up', 'down'] : ['down', 'up'];
    setTimeout(() => {
      const buttons = directions.map((word) => list.current?.querySelector<HTMLButtonElement>(`[data-move="${to}-${word}"]`));
      buttons.find((button) => button?.disabled === false)?.focus();
    });
  };
  const handleRemove = (index: number) => {
    remove(index);
    setTimeout(() => document.getElementById(fieldId(`panel.fields.${Math.max(0, index - 1)}.label`))?.focus());
  };
  const error = messageAt(form.formState.errors, 'panel.fields.root');
  return (
    <div>
      <chakra.ol ref={list} display="grid" gap="3">
        {fields.map(({ id }, index) => (
          <chakra.li key={id} bg="bg.panel" border="hairline" borderRadius="md" p="3" display="grid" gap="3">
            <Flex align="center" gap="1">
              <chakra.b flex="1" minW="0">
                <chakra.span color="fg.subtle">{index + 1}</chakra.span> {PARAMETERS[taken[index] ?? 'powerPercent'].label}
              </chakra.b>
              <RowButton word="Up" index={index} isDisabled={index === 0} onPress={() => handleMove(index, index - 1)} />
              <RowButton word="Down" index={index} isDisabled={index === fields.length - 1} onPress={() => handleMove(index, index + 1)} />
              <Button
                kind="quiet"
                size="touch"
                shape="square"
                icon={<CrossIcon />}
                aria-label={`Remove row ${index + 1}`}
                onClick={() => handleRemove(index)}
              />
            </Flex>
            <PanelRow form={form} index={index} taken={taken} />
          </chakra.li>
        ))}
      </chakra.ol>
      {error !== undefined && (
        <chakra.p mt="2" fontSize="sm" color="oxide.fg">
          {error}
        </chakra.p>
      )}
      {free !== undefined && (
        <Button mt="3" icon={<PlusIcon />} onClick={() => append(newPanelRow(free, locale))}>
          Add a row
        </Button>
      )}
    </div>
  );
}

type RowButtonProps = { word: 'Up' | 'Down'; index: number; isDisabled: boolean; onPress: () => void };

function RowButton({ word, index, isDisabled, onPress }: RowButtonProps) {
  return (
    <Button
      kind="quiet"
      size="touch"
      px="2.5"
      fontSize="sm"
      disabled={isDisabled}
      visibility={isDisabled ? 'hidden' : 'visible'}
      data-move={`${index}-${word.toLowerCase()}`}
      aria-label={`Move row ${index + 1} ${word.toLowerCase()}`}
      onClick={onPress}
    >
      {word}
    </Button>
  );
}
