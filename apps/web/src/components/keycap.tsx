import { chakra } from '@chakra-ui/react';

export const Keycap = chakra('kbd', {
  base: {
    fontFamily: 'body',
    fontSize: '13px',
    fontWeight: 'semibold',
    lineHeight: '18px',
    border: 'hairline',
    borderColor: 'border',
    borderBottomWidth: '2px',
    borderRadius: 'sm',
    px: '5px',
    bg: 'bg.panel',
    color: 'fg.muted',
    whiteSpace: 'nowrap',
  },
});
