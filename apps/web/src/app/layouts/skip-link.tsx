import { chakra } from '@chakra-ui/react';

const Anchor = chakra('a', {
  base: {
    position: 'fixed',
    left: '4',
    top: '-10rem',
    zIndex: 'status',
    px: '4',
    py: '3',
    bg: 'bg.panel',
    color: 'brand.fg',
    fontWeight: 'semibold',
    border: 'hairline',
    borderColor: 'border.emphasized',
    borderRadius: 'md',
    _focusVisible: { top: '4' },
  },
});

export function SkipLink() {
  return <Anchor href="#content">Skip to the content</Anchor>;
}
