import { chakra } from '@chakra-ui/react';
import { type Caution, CautionList } from '../../../components/caution-list';
import { GeneralCautions } from '../../../components/general-cautions';
import { asSentence, formatNumber } from '../../../lib/format';
import type { FinderAnswer, FinderCaution } from '../finder.api';

/** Cautions of this work side by side, the limits of use among them; those of all work in one line with their reasons behind a tap. */
export function Cautions({ cautions, answer }: { cautions: readonly FinderCaution[]; answer: FinderAnswer }) {
  const own = cautions.filter(({ isGeneral }) => !isGeneral).map(toCaution);
  const limits = limitsCaution(answer);
  return (
    <chakra.div display="grid" gap="2">
      <CautionList cautions={limits === undefined ? own : [...own, limits]} />
      <GeneralCautions cautions={cautions.filter(({ isGeneral }) => isGeneral)} />
    </chakra.div>
  );
}

function toCaution({ id, subject, text, source }: FinderCaution): Caution {
  return { key: id, act: subject, reason: text, source };
}

/** The author's limits stand among the cautions: outside of them the setting was never proved. */
function limitsCaution({ limits, revisionNumber }: FinderAnswer): Caution | undefined {
  const words = limitWords(limits);
  if (words === '') return undefined;
  return { key: 'limits', act: 'Only within the limits of use', reason: words, source: `Limits of use, revision ${revisionNumber}` };
}

/** "Thickness 1 to 3 mm. Flat parts only." */
export function limitWords({ thicknessMm, partDiameterMm, notes }: FinderAnswer['limits']): string {
  const ranges = [rangeWords('Thickness', thicknessMm), rangeWords('Part diameter', partDiameterMm)];
  return [...ranges, notes ?? '']
    .filter((words) => words !== '')
    .map(asSentence)
    .join(' ');
}

function rangeWords(what: string, range: { from?: number; to?: number } | undefined): string {
  if (range?.from !== undefined && range.to !== undefined) return `${what} ${formatNumber(range.from)} to ${formatNumber(range.to)} mm`;
  if (range?.from !== undefined) return `${what} from ${formatNumber(range.from)} mm`;
  return range?.to === undefined ? '' : `${what} up to ${formatNumber(range.to)} mm`;
}
