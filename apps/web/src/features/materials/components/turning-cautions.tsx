import { CautionList } from '../../../components/caution-list';
import { useCautions } from '../cautions.api';

/** The shop's cautions about turning parts. They defer to the machine's manual and the laser safety officer. */
export function TurningCautions() {
  const { data } = useCautions();
  const turning = (data?.items ?? []).filter(({ appliesTo }) => appliesTo.roundPart === true);
  return (
    <CautionList
      label="Cautions about turning parts"
      cautions={turning.map(({ id, subject, text, source }) => ({ key: id, act: subject, reason: text, source }))}
    />
  );
}
