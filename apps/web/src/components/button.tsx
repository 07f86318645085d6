import { Box, chakra, defineRecipe } from '@chakra-ui/react';
import type { ComponentProps, ReactNode } from 'react';
import { Link } from 'react-router';

/** Hover moves the ground one step, active one more; a disabled button keeps its label. */
const buttonRecipe = defineRecipe({
  base: {
    display: 'inline-flex',
    alignItems: 'center',
    justifyContent: 'center',
    gap: '2',
    position: 'relative',
    overflow: 'hidden',
    borderRadius: 'md',
    border: 'hairline',
    fontWeight: 'semibold',
    lineHeight: 'xl',
    textDecoration: 'none',
    whiteSpace: 'nowrap',
    cursor: 'pointer',
    transition: 'background-color 120ms, border-color 120ms',
    _disabled: { bg: 'bg.muted', color: 'fg.subtle', borderColor: 'border', cursor: 'not-allowed' },
  },
  variants: {
    kind: {
      primary: {
        bg: 'brand.solid',
        color: 'brand.contrast',
        borderColor: 'brand.solid',
        _hover: { bg: 'brand.fg', borderColor: 'brand.fg' },
        _active: { bg: 'fg', borderColor: 'fg', color: 'bg' },
      },
      plain: {
        bg: 'bg.panel',
        color: 'fg',
        borderColor: 'border.emphasized',
        _hover: { bg: 'bg.subtle' },
        _active: { bg: 'bg.muted' },
      },
      quiet: {
        bg: 'transparent',
        color: 'brand.fg',
        borderColor: 'transparent',
        _hover: { bg: 'brand.subtle' },
        _active: { bg: 'brand.muted' },
      },
      danger: {
        bg: 'bg.panel',
        color: 'oxide.fg',
        borderColor: 'oxide.emphasized',
        _hover: { bg: 'oxide.subtle' },
        _active: { bg: 'oxide.muted' },
      },
    },
    size: {
      control: { minHeight: { base: 'touch', lg: 'control' }, px: '4', fontSize: 'md' },
      touch: { minHeight: 'touch', px: '4', fontSize: 'md' },
      glove: { minHeight: { base: 'glove', lg: 'act' }, px: '6', fontSize: 'lg' },
      primaryAct: { minHeight: { base: 'primaryAct', lg: 'act' }, px: '6', fontSize: 'lg' },
    },
    shape: { text: {}, square: { px: '0', aspectRatio: '1' }, wide: { width: 'full' } },
  },
  defaultVariants: { kind: 'plain', size: 'control', shape: 'text' },
});

const ButtonFrame = chakra('button', buttonRecipe, { defaultProps: { type: 'button' } });
const LinkFrame = chakra(Link, buttonRecipe);

export type ButtonProps = ComponentProps<typeof ButtonFrame> & {
  icon?: ReactNode;
  /** The label stays and a bar moves under it; a second press does nothing. */
  isBusy?: boolean;
};

export function Button({ icon, isBusy = false, children, onClick, ...rest }: ButtonProps) {
  return (
    <ButtonFrame aria-busy={isBusy || undefined} onClick={isBusy ? swallow : onClick} {...rest}>
      {icon}
      {children}
      {isBusy && <BusyBar />}
    </ButtonFrame>
  );
}

export type ButtonLinkProps = ComponentProps<typeof LinkFrame> & { icon?: ReactNode };

/** A link that looks like a button: it leads somewhere and changes nothing. */
export function ButtonLink({ icon, children, ...rest }: ButtonLinkProps) {
  return (
    <LinkFrame {...rest}>
      {icon}
      {children}
    </LinkFrame>
  );
}

function BusyBar() {
  return (
    <Box position="absolute" insetX="0" bottom="0" height="3px" overflow="hidden" aria-hidden="true">
      <Box height="100%" width="25%" bg="currentColor" animation="slide 1.2s linear infinite" />
    </Box>
  );
}

function swallow(event: { preventDefault: () => void }) {
  event.preventDefault();
}
