import { chakra } from '@chakra-ui/react';
import { type Caution, CautionList } from '../../../components/caution-list';
import { CautionIcon } from '../../../components/icons';
import { formatNumber } from '../../../lib/format';
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

function GeneralCautions({ cautions }: { cautions: readonly FinderCaution[] }) {
  if (cautions.length === 0) return null;
  return (
    <chakra.details bg="straw.subtle" border="hairline" borderColor="straw.emphasized" borderRadius="md">
      <chakra.summary
        cursor="pointer"
        display="grid"
        gridTemplateColumns="34px minmax(0, 1fr) auto"
        alignItems="center"
        minHeight={{ base: 'glove', lg: 'touch' }}
        px="3.5"
        py="1.5"
        fontSize="sm"
        lineHeight="sm"
        borderRadius="md"
      >
        <chakra.span lineHeight="none">
          <CautionIcon size={20} />
        </chakra.span>
        <span>
          <b>With every job: </b>
          {cautions.map(({ subject }) => asSentence(subject)).join(' ')}
        </span>
        <chakra.span pl="4" color="brand.fg" textDecoration="underline">
          Why
        </chakra.span>
      </chakra.summary>
      <chakra.ul px="3.5" pb="3" display="grid" gap="2" fontSize="sm" lineHeight="sm">
        {cautions.map(({ id, subject, text, source }) => (
          <chakra.li key={id} pl="34px">
            <b>{asSentence(subject)}</b> {text} <chakra.span color="fg.muted">{source}</chakra.span>
          </chakra.li>
        ))}
      </chakra.ul>
    </chakra.details>
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

const asSentence = (words: string) => (/[.!?]$/.test(words) ? words : `${words}.`);
