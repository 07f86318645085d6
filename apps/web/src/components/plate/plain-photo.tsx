import { chakra } from '@chakra-ui/react';
import { useState } from 'react';
import { Dialog } from '../dialog';

export type PlainPhotoProps = {
  urls: { large: string; small: string };
  /** "Photo of C-0117, 13 May": what is seen, for the button and the full picture. */
  label: string;
  /** Side of the thumbnail; absent: as wide as its place. */
  sizePx?: number;
};

/** A photo as it was taken, not laid flat: small, and the whole picture on a tap. */
export function PlainPhoto({ urls, label, sizePx }: PlainPhotoProps) {
  const [isOpen, setIsOpen] = useState(false);
  return (
    <>
      <chakra.button
        type="button"
        display="block"
        width={sizePx === undefined ? 'full' : `${sizePx}px`}
        flexShrink={0}
        borderRadius="sm"
        cursor="zoom-in"
        aria-label={`${label}: whole picture`}
        onClick={() => setIsOpen(true)}
      >
        <chakra.img
          src={sizePx === undefined ? urls.large : urls.small}
          alt=""
          display="block"
          width="full"
          borderRadius="sm"
          {...(sizePx === undefined ? {} : { height: `${sizePx}px`, objectFit: 'cover' as const })}
        />
      </chakra.button>
      {isOpen && (
        <Dialog title={label} width="broad" onClose={() => setIsOpen(false)}>
          <chakra.img src={urls.large} alt={label} display="block" maxWidth="full" maxHeight="calc(100dvh - 140px)" mx="auto" />
        </Dialog>
      )}
    </>
  );
}
