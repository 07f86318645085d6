import { chakra } from '@chakra-ui/react';
import { FEATURE_KIND_LABELS, type Range, ROUTE_KIND_LABELS } from '@proofplate/recipe-model';
import { FactList } from '../../../components/fact-list';
import { StateMark } from '../../../components/state-mark';
import { formatDate, formatNumber, formatQuantity } from '../../../lib/format';
import { useSession } from '../../../lib/session';
import type { Revision } from '../recipes.api';

/** What the setting covers, where it comes from and until when it holds. */
export function RevisionFacts({ revision }: { revision: Revision }) {
  const { shop } = useSession();
  const { scope, limits, route, grounds, groundsBy, calibration, effectiveFrom, reviewDue, author, profile } = revision;
  const date = (time: string) => formatDate(time, shop.timeZone);
  const facts = [
    { label: 'Route', value: ROUTE_KIND_LABELS[route] },
    { label: 'Author', value: author.name },
    { label: 'Feature', value: scope.featureKind === undefined ? 'any' : FEATURE_KIND_LABELS[scope.featureKind] },
    ...rangeFact('Feature size', scope.featureSizeMm),
    ...rangeFact('Thickness', scope.thicknessMm),
    ...rangeFact('Part diameter', scope.partDiameterMm),
    ...rangeFact('Use for thickness', limits.thicknessMm),
    ...rangeFact('Use for diameter', limits.partDiameterMm),
    ...(scope.customerSpecification === undefined ? [] : [{ label: 'Customer specification', value: scope.customerSpecification }]),
    { label: 'Power table', value: calibration === null ? 'none cited' : `${date(calibration.measuredOn)}, ${calibration.meter}` },
    { label: 'Machine profile', value: profile.isPresent ? `version ${profile.number}` : `version ${profile.number}, changed since` },
    ...(effectiveFrom === null ? [] : [{ label: 'Takes effect', value: date(effectiveFrom) }]),
    ...(reviewDue === null ? [] : [{ label: 'Re-prove by', value: date(reviewDue) }]),
  ];
  return (
    <>
      <FactList facts={facts} />
      {limits.notes !== '' && (
        <chakra.p mt="2">
          <b>Limits of use: </b>
          {limits.notes}
        </chakra.p>
      )}
      {grounds !== '' && (
        <chakra.p mt="2">
          <b>Grounds{groundsBy === null ? '' : ` of ${groundsBy.name}`}: </b>
          {grounds}
        </chakra.p>
      )}
    </>
  );
}

function rangeFact(label: string, range: Range | undefined) {
  const words = rangeWords(range);
  return words === undefined ? [] : [{ label, value: words }];
}

/** "2 to 5 mm", "from 2 mm", "up to 5 mm". */
export function rangeWords(range: Range | undefined): string | undefined {
  const { from, to } = range ?? {};
  if (from !== undefined && to !== undefined) return `${formatNumber(from)} to ${formatQuantity(to, 'mm')}`;
  if (from !== undefined) return `from ${formatQuantity(from, 'mm')}`;
  return to === undefined ? undefined : `up to ${formatQuantity(to, 'mm')}`;
}

/** What is done before marking, in its order. */
export function SetUpSteps({ steps }: { steps: Revision['setUpSteps'] }) {
  if (steps.length === 0) return <chakra.p color="fg.muted">No set-up step is written.</chakra.p>;
  return (
    <chakra.ol>
      {steps.map(({ text, caution, mustTick }, index) => (
        <chakra.li
          key={`${index + 1} ${text}`}
          display="grid"
          gridTemplateColumns="28px minmax(0, 1fr)"
          py="1.5"
          borderTop="hairline"
          _first={{ borderTop: 'none' }}
        >
          <chakra.span color="fg.subtle">{index + 1}</chakra.span>
          <span>
            {text}
            {mustTick && (
              <chakra.span fontSize="sm" color="fg.muted">
                {' '}
                must be ticked
              </chakra.span>
            )}
            {caution !== undefined && caution !== '' && (
              <chakra.span display="block" fontSize="sm" css={{ '& span': { whiteSpace: 'normal' } }}>
                <StateMark state="caution">{caution}</StateMark>
              </chakra.span>
            )}
          </span>
        </chakra.li>
      ))}
    </chakra.ol>
  );
}
