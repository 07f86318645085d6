import { chakra } from '@chakra-ui/react';
import { CautionList } from '../../../components/caution-list';
import { GeneralCautions } from '../../../components/general-cautions';
import type { Run } from '../runs.api';

/** Cautions stand before the setting: those of this work in full, those of all work in one row. */
export function RunCautions({ cautions }: Pick<Run, 'cautions'>) {
  if (cautions.length === 0) return null;
  const own = cautions.filter(({ isGeneral }) => !isGeneral);
  return (
    <chakra.div display="grid" gap="2">
      <CautionList cautions={own.map(({ id, subject, text, source }) => ({ key: id, act: subject, reason: text, source }))} />
      <GeneralCautions cautions={cautions.filter(({ isGeneral }) => isGeneral)} />
    </chakra.div>
  );
}
