import { chakra } from '@chakra-ui/react';
import { type ReactNode, useId } from 'react';

export type SwitchProps = {
  label: string;
  isOn: boolean;
  onChange: (isOn: boolean) => void;
  help?: ReactNode;
  isDisabled?: boolean;
};

/** Takes effect at once; its state shows by the thumb's place and by colour. */
export function Switch({ label, isOn, onChange, help, isDisabled = false }: SwitchProps) {
  const helpId = useId();
  return (
    <div>
      <chakra.button
        type="button"
        role="switch"
        aria-checked={isOn}
        aria-describedby={help === undefined ? undefined : helpId}
        disabled={isDisabled}
        onClick={() => onChange(!isOn)}
        display="inline-flex"
        alignItems="center"
        gap="3"
        minHeight={{ base: 'touch', lg: '6' }}
        borderRadius="md"
        cursor="pointer"
        textAlign="left"
        _disabled={{ color: 'fg.subtle', cursor: 'not-allowed' }}
      >
        <chakra.span
          aria-hidden="true"
          position="relative"
          flexShrink={0}
          width="36px"
          height="20px"
          borderRadius="full"
          border="hairline"
          borderColor={isOn ? 'brand.solid' : 'border.emphasized'}
          bg={isOn ? 'brand.solid' : 'bg.panel'}
        >
          <chakra.span
            position="absolute"
            top="2px"
            left={isOn ? '18px' : '2px'}
            boxSize="14px"
            borderRadius="full"
            bg={isOn ? 'brand.contrast' : 'border.emphasized'}
            transition="left 120ms"
          />
        </chakra.span>
        {label}
      </chakra.button>
      {help !== undefined && (
        <chakra.div id={helpId} fontSize="sm" lineHeight="sm" color="fg.muted" mt="1">
          {help}
        </chakra.div>
      )}
    </div>
  );
}
