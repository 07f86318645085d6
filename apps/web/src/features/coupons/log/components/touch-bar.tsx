import { Box, chakra } from '@chakra-ui/react';
import { Button } from '../../../../components/button';
import { ChevronLeftIcon, ChevronRightIcon } from '../../../../components/icons';
import { Rating } from '../../../../components/rating';

export type TouchBarProps = {
  address: string;
  rating: number | null;
  isDisabled: boolean;
  onRate: (rating: number) => void;
  onStep: (step: 1 | -1) => void;
};

/** Rating is the act that is repeated for every cell, so on touch it has the bar under the thumb. */
export function TouchBar({ address, rating, isDisabled, onRate, onStep }: TouchBarProps) {
  return (
    <Box
      data-rating-bar
      display={{ base: 'flex', lg: 'none' }}
      position="fixed"
      insetX="0"
      bottom="var(--pp-sizes-bar)"
      zIndex="acts"
      alignItems="center"
      gap={{ base: '1.5', sm: '3' }}
      px={{ base: '3', sm: '6' }}
      py={{ base: '2.5', sm: '3' }}
      bg="bg"
      borderTop="hairline"
      role="group"
      aria-label={`Rate ${address}`}
    >
      <chakra.span display={{ base: 'none', sm: 'block' }} fontSize="3xl" fontWeight="bold" minW="44px">
        {address}
      </chakra.span>
      <StepButton label="Cell before" step={-1} onStep={onStep} />
      <Box flex="1" minW="0">
        {isDisabled ? (
          <chakra.p textAlign="center" fontSize="sm" lineHeight="sm" color="fg.muted">
            {address} is not rated here now
          </chakra.p>
        ) : (
          <Rating label={`Rating of ${address}`} value={rating ?? undefined} onRate={onRate} hasCaptions={false} />
        )}
      </Box>
      <StepButton label="Next cell" step={1} onStep={onStep} />
    </Box>
  );
}

function StepButton({ label, step, onStep }: { label: string; step: 1 | -1; onStep: (step: 1 | -1) => void }) {
  return (
    <Button
      aria-label={label}
      minHeight="glove"
      width={{ base: '44px', sm: 'glove' }}
      px="0"
      flexShrink={0}
      icon={step === 1 ? <ChevronRightIcon /> : <ChevronLeftIcon />}
      onClick={() => onStep(step)}
    />
  );
}
