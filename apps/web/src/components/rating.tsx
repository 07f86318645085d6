import { chakra, Flex } from '@chakra-ui/react';
import { RATING_CAPTIONS } from '@proofplate/recipe-model';
import type { KeyboardEvent } from 'react';
import { useRovingRadio } from './roving-radio';

const RATINGS = ['0', '1', '2', '3', '4', '5'] as const;

export type RatingProps = {
  /** "Rating of B4". */
  label: string;
  value: number | undefined;
  onRate: (rating: number) => void;
  /** Captions under the ends; left out in a bar. */
  hasCaptions?: boolean;
};

const RatingButton = chakra('button', {
  base: {
    minHeight: { base: 'glove', lg: 'touch' },
    minWidth: '0',
    border: 'hairline',
    borderColor: 'border.emphasized',
    borderRadius: 'md',
    bg: 'bg.panel',
    fontSize: 'xl',
    fontWeight: 'semibold',
    cursor: 'pointer',
    _hover: { bg: 'bg.subtle' },
    _checked: { bg: 'brand.solid', borderColor: 'brand.solid', color: 'brand.contrast' },
  },
});

/** Six equal buttons; the keys 0 to 5 work as soon as one has the focus. */
export function Rating({ label, value, onRate, hasCaptions = true }: RatingProps) {
  const radio = useRovingRadio({ values: RATINGS, value: ratingText(value), onChange: (text) => onRate(Number(text)) });
  const handleKeyDown = (event: KeyboardEvent) => {
    if (/^[0-5]$/.test(event.key)) onRate(Number(event.key));
  };
  return (
    <div>
      <chakra.div
        role="radiogroup"
        aria-label={label}
        onKeyDown={handleKeyDown}
        display="grid"
        gridTemplateColumns="repeat(6, minmax(0, 1fr))"
        gap={{ base: '1.5', sm: '2' }}
      >
        {RATINGS.map((rating) => (
          <RatingButton key={rating} type="button" {...radio(rating)}>
            {rating}
          </RatingButton>
        ))}
      </chakra.div>
      {hasCaptions && (
        <Flex justify="space-between" mt="1" fontSize="sm" lineHeight="sm" color="fg.muted" aria-hidden="true">
          <span>{RATING_CAPTIONS[0]}</span>
          <span>{RATING_CAPTIONS[5]}</span>
        </Flex>
      )}
    </div>
  );
}

function ratingText(value: number | undefined): (typeof RATINGS)[number] | undefined {
  return RATINGS.find((rating) => Number(rating) === value);
}
