import { chakra } from '@chakra-ui/react';
import type { FrequencyInterval } from '@proofplate/recipe-model';
import { useId, useState } from 'react';
import { Button } from '../../../components/button';
import { NumberField } from '../../../components/field';
import { readNumber, typedNumber } from '../../../lib/read-number';
import { useSession } from '../../../lib/session';

export type FrequencyChoiceProps = {
  step: number;
  interval: FrequencyInterval;
  /** As the panel shows it; undefined: nothing is proposed there. */
  shownKhz: number | undefined;
  isChosen: boolean;
  /** The smallest change that the panel shows, kHz. */
  panelStepKhz: number | undefined;
  onChoose: (khz: number | undefined) => void;
};

const DIVISIONS = 200;
const DIGITS = 6;
/** Finer than any panel; the ends are named inside the interval. */
const TYPED_STEP = 0.001;

/** A frequency inside the interval: by a slider that arrow keys move, or typed. */
export function FrequencyChoice({ step, interval, shownKhz, isChosen, panelStepKhz, onChoose }: FrequencyChoiceProps) {
  const { shop } = useSession();
  const sliderId = useId();
  const { lowestKhz, highestKhz, sourceKhz } = interval;
  const valueKhz = shownKhz ?? Math.min(Math.max(sourceKhz, lowestKhz), highestKhz);
  const stepKhz = panelStepKhz ?? (highestKhz - lowestKhz) / DIVISIONS;
  const [typing, setTyping] = useState<string>();
  const rule = { what: 'The frequency', unit: 'kHz', least: ceilTo(lowestKhz, TYPED_STEP), most: floorTo(highestKhz, TYPED_STEP) };
  const read = typing === undefined ? undefined : readNumber(typing, rule, shop.locale);
  const handleTyped = (text: string) => {
    setTyping(text);
    const now = readNumber(text, rule, shop.locale);
    if ('value' in now) onChoose(now.value);
  };
  return (
    <chakra.div display="grid" gap="4" gridTemplateColumns={{ base: 'minmax(0, 1fr)', sm: 'minmax(0, 1fr) 200px' }} alignItems="start">
      <div>
        <chakra.label htmlFor={sliderId} fontWeight="semibold" fontSize="sm">
          Frequency inside the interval
        </chakra.label>
        <chakra.input
          id={sliderId}
          type="range"
          width="full"
          minHeight="44px"
          accentColor="brand.solid"
          min={ceilTo(lowestKhz, stepKhz)}
          max={highestKhz}
          step={stepKhz}
          value={valueKhz}
          aria-valuetext={`${rounded(valueKhz)} kilohertz`}
          onChange={(event) => {
            setTyping(undefined);
            onChoose(Number(event.currentTarget.value));
          }}
        />
        {isChosen && (
          <Button
            kind="quiet"
            onClick={() => {
              setTyping(undefined);
              onChoose(undefined);
            }}
          >
            Nearest to the source’s again
          </Button>
        )}
      </div>
      <NumberField
        name={`frequency-${step}`}
        label="Frequency"
        unit="kHz"
        value={typing ?? typedNumber(rounded(valueKhz), shop.locale)}
        error={read !== undefined && 'message' in read ? read.message : undefined}
        onChange={(event) => handleTyped(event.currentTarget.value)}
        onBlur={() => read !== undefined && 'value' in read && setTyping(undefined)}
      />
    </chakra.div>
  );
}

const rounded = (khz: number) => Number(khz.toPrecision(DIGITS));
const floorTo = (value: number, step: number) => Number((Math.floor(value / step + 1e-9) * step).toPrecision(12));
const ceilTo = (value: number, step: number) => Number((Math.ceil(value / step - 1e-9) * step).toPrecision(12));
