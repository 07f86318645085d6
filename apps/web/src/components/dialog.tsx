import { chakra, Flex } from '@chakra-ui/react';
import { type ReactNode, useId, useLayoutEffect, useRef } from 'react';
import { Button } from './button';
import { CrossIcon } from './icons';

const Frame = chakra('dialog', {
  base: {
    m: 'auto',
    p: '0',
    width: 'calc(100vw - 32px)',
    maxHeight: 'calc(100dvh - 32px)',
    overflow: 'auto',
    color: 'fg',
    bg: 'bg.panel',
    border: 'hairline',
    borderRadius: 'md',
    boxShadow: 'popover',
    _backdrop: { bg: 'rgba(20, 22, 26, 0.45)' },
  },
});

export type DialogProps = {
  title: string;
  /** For a dialog whose content shows its own purpose; the title is spoken only. */
  isTitleHidden?: boolean;
  width?: 'narrow' | 'wide' | 'broad';
  place?: 'middle' | 'top';
  onClose: () => void;
  children: ReactNode;
  /** Buttons at the end, the act last. */
  actions?: ReactNode;
};

/** A modal dialog; the browser keeps the focus inside, Escape closes, and the focus goes back to where it was. */
export function Dialog({ title, isTitleHidden = false, width = 'narrow', place = 'middle', onClose, children, actions }: DialogProps) {
  const dialog = useRef<HTMLDialogElement>(null);
  const titleId = useId();
  // closed before it leaves the page: only then the browser gives the focus back
  useLayoutEffect(() => {
    const element = dialog.current;
    element?.showModal();
    return () => element?.close();
  }, []);

  const handleBackdrop = (event: { target: unknown }) => {
    if (event.target === dialog.current) onClose();
  };
  return (
    <Frame
      ref={dialog}
      maxWidth={WIDTHS[width]}
      mt={place === 'top' ? { base: '4', md: '12vh' } : 'auto'}
      aria-labelledby={titleId}
      onCancel={(event) => {
        event.preventDefault();
        onClose();
      }}
      onPointerDown={handleBackdrop}
    >
      {isTitleHidden ? (
        <chakra.h2 id={titleId} srOnly>
          {title}
        </chakra.h2>
      ) : (
        <Flex align="center" justify="space-between" gap="4" pl="5" pr="2" pt="2">
          <chakra.h2 id={titleId}>{title}</chakra.h2>
          <Button kind="quiet" size="touch" shape="square" aria-label="Close" onClick={onClose} icon={<CrossIcon />} />
        </Flex>
      )}
      {isTitleHidden ? (
        children
      ) : (
        <chakra.div px="5" pb="5">
          {children}
        </chakra.div>
      )}
      {actions !== undefined && (
        <Flex gap="2" wrap="wrap" justify="flex-end" px="5" py="4" borderTop="hairline">
          {actions}
        </Flex>
      )}
    </Frame>
  );
}

const WIDTHS = { narrow: '480px', wide: '640px', broad: '960px' } as const;
