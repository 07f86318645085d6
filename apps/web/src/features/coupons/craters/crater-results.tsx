import { chakra } from '@chakra-ui/react';
import { FactList } from '../../../components/fact-list';
import { formatNumber } from '../../../lib/format';
import { withError } from './crater-words';
import type { CraterFit, CraterIncubation, CraterLine } from './craters.api';

/** The numbers in words: each with its unit, its standard error and how many craters it rests on. */
export function CraterResults({ found, fit }: { found: CraterFit; fit: CraterLine }) {
  const { pointCount, incubation } = found;
  const threshold = withError(fit.thresholdPeakFluenceJPerCm2, fit.thresholdPeakFluenceStandardErrorJPerCm2, 'J/cm²');
  return (
    <>
      <FactList
        facts={[
          { label: 'Spot diameter (1/e²)', value: withError(2 * fit.spotRadiusUm, 2 * fit.spotRadiusStandardErrorUm, 'um') },
          { label: 'Threshold, peak fluence', value: threshold },
          { label: 'Threshold, pulse energy', value: withError(fit.thresholdEnergyUj, fit.thresholdEnergyStandardErrorUj, 'uJ') },
          { label: 'Craters in the line', value: formatNumber(pointCount) },
          { label: 'R²', value: formatNumber(fit.rSquared, { decimals: 4 }) },
        ]}
      />
      <chakra.p fontSize="sm" lineHeight="sm" color="fg.muted" mt="1">
        ± is one standard error from the scatter of these craters. Errors of the power meter and of the microscope’s scale come on top.
      </chakra.p>
      {incubation !== null && <Incubation incubation={incubation} />}
    </>
  );
}

function Incubation({ incubation: { incubationCoefficient, singlePulseThresholdJPerCm2, thresholds } }: { incubation: CraterIncubation }) {
  return (
    <chakra.section mt="3" aria-label="Incubation">
      <chakra.h3 mb="1">Threshold over pulses on one place</chakra.h3>
      <FactList
        facts={[
          ...thresholds.map(({ pulses, points, thresholdPeakFluenceJPerCm2, standardErrorJPerCm2 }) => ({
            label: `${pulses} ${pulses === 1 ? 'pulse' : 'pulses'}, n = ${points}`,
            value: withError(thresholdPeakFluenceJPerCm2, standardErrorJPerCm2, 'J/cm²'),
          })),
          { label: 'Incubation coefficient S', value: formatNumber(incubationCoefficient, { significantDigits: 3 }) },
          { label: 'One pulse by that line', value: formatNumber(singlePulseThresholdJPerCm2, { significantDigits: 3 }), unit: 'J/cm²' },
        ]}
      />
    </chakra.section>
  );
}
