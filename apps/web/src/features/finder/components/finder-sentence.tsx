import { chakra } from '@chakra-ui/react';
import type { ReactNode } from 'react';
import { type Choice, type FinderResult, SLOTS, type SlotKey } from '../finder.api';
import { shownInSlot } from '../sentence';
import { FinderSlot } from './finder-slot';

export type FinderSentenceProps = {
  result: FinderResult;
  choice: Choice;
  onChoose: (slot: SlotKey, id: string | undefined) => void;
  /** Stands at the end of the last line where there is room, else under it. */
  trailing: ReactNode;
};

/** "On Bench 2 with the F160 lens, mark black anodised 6061 with a sealed satin finish, for a white mark." */
export function FinderSentence({ result, choice, onChoose, trailing }: FinderSentenceProps) {
  const shown = Object.fromEntries(SLOTS.map((slot) => [slot, shownInSlot(slot, choice, result)]));
  const slot = (key: SlotKey) => (
    <FinderSlot slot={key} view={result.slots[key]} shownId={shown[key]} onChoose={(id) => onChoose(key, id)} />
  );
  const effectName = result.slots.effect.options.find(({ id }) => id === shown.effect)?.name ?? '';
  return (
    <chakra.div
      fontSize={{ base: 'lg', sm: '2xl' }}
      lineHeight={{ base: '2.75rem', sm: '2.5rem' }}
      display={{ base: 'block', sm: 'flex' }}
      flexWrap="wrap"
      columnGap="2.5"
      rowGap="1"
      role="group"
      aria-label="Finder"
    >
      <span>On </span>
      {slot('machine')}
      <span> with the </span>
      {slot('lens')}
      <span> lens, mark </span>
      {slot('material')}
      <span> with a </span>
      {slot('finish')}
      <span> finish, for {/mark$/i.test(effectName) ? 'a ' : ''}</span>
      <chakra.span display={{ base: 'inline', sm: 'inline-flex' }} columnGap="1">
        {slot('effect')}.
      </chakra.span>
      <chakra.div
        flexGrow="1"
        display="flex"
        flexWrap="wrap"
        alignItems="center"
        justifyContent="flex-end"
        columnGap="4"
        rowGap="1"
        mt={{ base: '2', sm: '0' }}
        fontSize="md"
        lineHeight="md"
        minHeight="40px"
        alignSelf="flex-start"
      >
        {trailing}
      </chakra.div>
    </chakra.div>
  );
}
