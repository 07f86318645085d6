import { Box, chakra, Flex } from '@chakra-ui/react';
import { createContext, type ReactNode, useCallback, useContext, useEffect, useMemo, useState } from 'react';
import { Button } from './button';
import { CrossIcon } from './icons';

/** Undo stays for longer than this while the pointer or the focus is on it. */
const SHOWN_FOR_MS = 12_000;

/** The bar that rates cells is the act that is repeated: nothing may lie over it. */
const ABOVE_RATING_BAR = { 'body:has([data-rating-bar]) &': { bottom: { base: 'calc(var(--pp-sizes-bar) + 104px)', lg: '6' } } };

export type StatusMessage = { text: string; undo?: () => void };

const StatusContext = createContext<((message: StatusMessage | string) => void) | undefined>(undefined);

/** Says what was done, with Undo where it can be taken back. One line, read out, never in the way of the keyboard. */
export function useStatusLine(): (message: StatusMessage | string) => void {
  const announce = useContext(StatusContext);
  if (announce === undefined) throw new Error('useStatusLine needs a StatusLineProvider above it');
  return announce;
}

export function StatusLineProvider({ children }: { children: ReactNode }) {
  const [message, setMessage] = useState<StatusMessage>();
  const [isHeld, setIsHeld] = useState(false);
  const announce = useCallback((next: StatusMessage | string) => setMessage(typeof next === 'string' ? { text: next } : next), []);
  const close = useCallback(() => {
    setMessage(undefined);
    setIsHeld(false);
  }, []);

  useEffect(() => {
    if (message === undefined || isHeld) return undefined;
    const timer = setTimeout(close, SHOWN_FOR_MS);
    return () => clearTimeout(timer);
  }, [message, isHeld, close]);

  const hold = useMemo(
    () => ({
      onPointerEnter: () => setIsHeld(true),
      onPointerLeave: () => setIsHeld(false),
      onFocus: () => setIsHeld(true),
      onBlur: () => setIsHeld(false),
    }),
    [],
  );

  return (
    <StatusContext.Provider value={announce}>
      {children}
      <Box
        position="fixed"
        insetX="0"
        bottom={{ base: 'calc(var(--pp-sizes-bar) + 16px)', lg: '6' }}
        css={ABOVE_RATING_BAR}
        zIndex="status"
        display="flex"
        justifyContent="center"
        px="4"
        pointerEvents="none"
      >
        <div role="status">{message !== undefined && <StatusBar message={message} onClose={close} hold={hold} />}</div>
      </Box>
    </StatusContext.Provider>
  );
}

type StatusBarProps = { message: StatusMessage; onClose: () => void; hold: Record<string, () => void> };

function StatusBar({ message, onClose, hold }: StatusBarProps) {
  const handleUndo = () => {
    message.undo?.();
    onClose();
  };
  return (
    <Flex
      {...hold}
      align="center"
      gap="2"
      pl="4"
      pr="1"
      py="1"
      pointerEvents="auto"
      bg="bg.inverted"
      color="fg.inverted"
      borderRadius="md"
      boxShadow="popover"
    >
      <chakra.span py="2">{message.text}</chakra.span>
      {message.undo !== undefined && (
        <Button kind="quiet" size="touch" color="inherit" textDecoration="underline" onClick={handleUndo}>
          Undo
        </Button>
      )}
      <Button
        kind="quiet"
        size="touch"
        shape="square"
        color="inherit"
        aria-label="Close the message"
        onClick={onClose}
        icon={<CrossIcon />}
      />
    </Flex>
  );
}
