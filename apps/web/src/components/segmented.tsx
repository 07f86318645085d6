import { chakra } from '@chakra-ui/react';
import { useRovingRadio } from './roving-radio';

export type SegmentedChoice<T extends string> = { value: T; label: string };

export type SegmentedProps<T extends string> = {
  label: string;
  choices: readonly SegmentedChoice<T>[];
  value: T;
  onChange: (value: T) => void;
  /** Fills the width, each choice the same. */
  isWide?: boolean;
  /** 'glove' on screens that are used with gloves. */
  size?: 'touch' | 'glove';
};

const Choice = chakra('button', {
  base: {
    px: { base: '1.5', sm: '3.5' },
    flexGrow: '1',
    borderRight: 'hairline',
    cursor: 'pointer',
    outlineOffset: '-3px !important',
    _hover: { bg: 'bg.subtle' },
    _last: { borderRight: '0' },
    _checked: {
      bg: 'brand.solid',
      color: 'brand.contrast',
      fontWeight: 'semibold',
      outlineColor: 'brand.contrast !important',
      _hover: { bg: 'brand.solid' },
    },
  },
  variants: {
    // The line around the group adds 2 px.
    size: { touch: { minHeight: { base: '46px', lg: '38px' } }, glove: { minHeight: { base: 'glove', lg: '54px' } } },
  },
});

/** One of a few: a radio group in one tab stop. */
export function Segmented<T extends string>({ label, choices, value, onChange, isWide = false, size = 'touch' }: SegmentedProps<T>) {
  const radio = useRovingRadio({ values: choices.map((choice) => choice.value), value, onChange });
  return (
    <chakra.div
      role="radiogroup"
      aria-label={label}
      display={isWide ? 'flex' : 'inline-flex'}
      maxW="full"
      border="hairline"
      borderColor="border.emphasized"
      borderRadius="md"
      bg="bg.panel"
      overflow="hidden"
    >
      {choices.map((choice) => (
        <Choice key={choice.value} type="button" size={size} flexBasis={isWide ? '0' : 'auto'} {...radio(choice.value)}>
          {choice.label}
        </Choice>
      ))}
    </chakra.div>
  );
}
