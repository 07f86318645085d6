import { Box, chakra, Flex } from '@chakra-ui/react';
import { useId } from 'react';
import { formatNumber } from '../../lib/format';
import { cividisStops } from './cividis';
import { type ResponseScale, scalePosition, scaleTicks } from './response-scale';

const GRADIENT = `linear-gradient(90deg, ${cividisStops(16).join(', ')})`;

export type HeatLegendProps = {
  /** The response with its unit: "Dose, J/mm²". */
  title: string;
  scale: ResponseScale;
  /** Words for the ends: "24 dark", "75 bare steel". Without them the numbers alone. */
  lowText?: string;
  highText?: string;
  hasMissing?: boolean;
};

export function HeatLegend({ title, scale, lowText, highText, hasMissing = false }: HeatLegendProps) {
  return (
    <Flex
      align="flex-start"
      columnGap="3"
      wrap="wrap"
      fontSize="sm"
      lineHeight="sm"
      color="fg.muted"
      role="group"
      aria-label={`Legend: ${title}`}
    >
      <chakra.span whiteSpace="nowrap">{title}</chakra.span>
      <chakra.span whiteSpace="nowrap">{lowText ?? formatNumber(scale.min)}</chakra.span>
      <Box flex="1" minW="120px">
        <Box height="12px" mt="4px" borderRadius="sm" style={{ background: GRADIENT }} />
        <Box position="relative" height="20px" aria-hidden="true">
          {scaleTicks(scale).map((tick) => (
            <chakra.span
              key={tick}
              position="absolute"
              style={{ left: `${(scalePosition(scale, tick) * 100).toFixed(2)}%`, transform: 'translateX(-50%)' }}
            >
              {formatNumber(tick)}
            </chakra.span>
          ))}
        </Box>
      </Box>
      <chakra.span whiteSpace="nowrap">{highText ?? formatNumber(scale.max)}</chakra.span>
      {hasMissing && <MissingKey />}
    </Flex>
  );
}

function MissingKey() {
  const id = useId();
  return (
    <Flex as="span" gap="1.5" align="center" whiteSpace="nowrap">
      <svg width="16" height="16" aria-hidden="true">
        <defs>
          <pattern id={id} width="5" height="5" patternUnits="userSpaceOnUse" patternTransform="rotate(45)">
            <path d="M0 0v5" stroke="currentColor" strokeWidth="2" />
          </pattern>
        </defs>
        <rect width="16" height="16" fill={`url(#${id})`} />
      </svg>
      not measured
    </Flex>
  );
}
