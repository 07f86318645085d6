import { chakra } from '@chakra-ui/react';
import { cellAddress, type DoseCaution, type HeadOverheads, stepNumbers } from '@proofplate/recipe-model';
import { memo, useMemo } from 'react';
import { type UseFormReturn, useWatch } from 'react-hook-form';
import { NumbersPanel } from '../../../components/numbers-panel/numbers-panel';
import { Panel } from '../../../components/page';
import { numbersGroups } from '../../../components/setting-numbers';
import { measuredCalibration } from '../../../lib/measured-calibration';
import { type Machine, type MachineLens, useNewestCalibration } from '../coupons.api';
import type { PlanValues } from './plan-values';
import { type CellPlace, plannedSetting } from './planned-setting';

export type PlanNumbersProps = {
  form: UseFormReturn<PlanValues>;
  machine: Machine;
  lens: MachineLens | undefined;
  place: CellPlace;
  doseCaution: DoseCaution | null;
  /** Of the machine; undefined until the plan was worked out once. */
  overheads: HeadOverheads | undefined;
  cellMm: number;
  locale: string;
};

/** What follows from the chosen cell. */
export const PlanNumbers = memo(NumbersOfPlan);

function NumbersOfPlan(props: PlanNumbersProps) {
  const { lens, place } = props;
  const address = cellAddress(place.row, place.column);
  return (
    <Panel px="5" py="4" aria-label={`Numbers of ${address}`}>
      <chakra.h2 fontSize="md" lineHeight="md">
        What follows in {address}
      </chakra.h2>
      {lens === undefined ? (
        <p>Choose the lens: spot, fluence and overlap depend on it.</p>
      ) : (
        <LiveNumbers {...props} lens={lens} label={`What follows in ${address}`} />
      )}
    </Panel>
  );
}

type LiveNumbersProps = PlanNumbersProps & { lens: MachineLens; label: string };

/** Watches what is typed; nothing else of the page is drawn again at a key. */
function LiveNumbers({ form, machine, lens, place, doseCaution, overheads, cellMm, locale, label }: LiveNumbersProps) {
  const [base, rows, columns] = useWatch({ control: form.control, name: ['base', 'rows', 'columns'] });
  const calibration = useNewestCalibration(machine.id);
  const typed = useMemo(() => {
    const { physical, panel } = machine.profile;
    return { physical, panel, ...(calibration === undefined ? {} : { calibration: measuredCalibration(calibration) }) };
  }, [machine, calibration]);
  const { focalLengthMm, measuredSpotUm } = lens;
  const numbers = stepNumbers(plannedSetting({ base, rows, columns }, typed, { place, locale }), {
    optics: { physical: typed.physical, focalLengthMm, measuredSpotUm },
    panel: typed.panel,
    doseCaution,
    areaMm: { widthMm: cellMm, heightMm: cellMm },
    overheads,
  });
  return <NumbersPanel label={label} groups={numbersGroups([numbers])} />;
}
