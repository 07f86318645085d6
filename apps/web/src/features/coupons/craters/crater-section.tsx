import { Box, chakra, Flex } from '@chakra-ui/react';
import { type ReactNode, useState } from 'react';
import { Button } from '../../../components/button';
import { Panel } from '../../../components/page';
import { ReadProblem } from '../../../components/read-problem';
import { SkeletonBlock } from '../../../components/skeletons';
import { StateShape } from '../../../components/state-mark';
import { useStatusLine } from '../../../components/status-line';
import { TextLink } from '../../../components/text-link';
import { formatNumber } from '../../../lib/format';
import { paths } from '../../../lib/paths';
import type { Coupon } from '../coupons.api';
import { CraterPlot } from './crater-plot';
import { CraterResults } from './crater-results';
import { CraterTable } from './crater-table';
import { seriesWords, withError } from './crater-words';
import { type CraterFit, useCraterFit } from './craters.api';
import { leftOutByReason } from './left-out';
import { SaveSpotDialog } from './save-spot-dialog';

const TITLE_ID = 'craters-title';

/** What the crater diameters on a coupon say of the threshold and of the spot that marked them. */
export function CraterSection({ coupon }: { coupon: Pick<Coupon, 'id' | 'code'> }) {
  const { data, error, mutate } = useCraterFit(coupon.id);
  return (
    <Panel px="5" py="4" aria-labelledby={TITLE_ID}>
      <chakra.h2 id={TITLE_ID} mb="2">
        Threshold and spot
      </chakra.h2>
      {data === undefined && error === undefined && <SkeletonBlock height="380px" label="Working out threshold and spot" />}
      {data === undefined && error !== undefined && (
        <ReadProblem problem={error} thing="threshold and spot" onRetry={() => void mutate()} />
      )}
      {data !== undefined && <Found found={data} />}
    </Panel>
  );
}

function Found({ found }: { found: CraterFit }) {
  const { fit, points, series, refusedBecause, remarks } = found;
  return (
    <Box display="grid" gap="4">
      {refusedBecause !== null && <Look isRefused>No line: {refusedBecause}</Look>}
      <Box
        display="grid"
        gap={{ base: '4', xl: '8' }}
        gridTemplateColumns={{ base: 'minmax(0, 1fr)', xl: 'minmax(0, 640px) minmax(0, 1fr)' }}
        alignItems="start"
      >
        <Box minW="0">
          <CraterPlot label={plotWords(found)} points={points} line={fit} />
          {series !== null && (
            <chakra.p fontSize="sm" lineHeight="sm" color="fg.muted" mt="1">
              Filled: craters of {seriesWords(series)}. {points.some(isLeftOut) && 'Hollow: left out. '}
              {fit !== null && 'The stroke on the axis is the threshold.'}
            </chakra.p>
          )}
        </Box>
        <Box minW="0">
          {fit !== null && <CraterResults found={found} fit={fit} />}
          <SaveSpot found={found} />
        </Box>
      </Box>
      {remarks.map((remark) => (
        <Look key={remark}>{remark}</Look>
      ))}
      <LeftOut points={points} />
      <CraterTable points={points} />
      <chakra.p fontSize="sm" lineHeight="sm" color="fg.muted" maxW="640px">
        {found.formula}. {found.source}. It holds for a Gaussian spot, one threshold, the same number of pulses on each place, spots that do
        not touch, and up to about ten thresholds. It proves no setting.{' '}
        <TextLink to={paths.science('ablation')}>More about this: threshold and spot from craters</TextLink>
      </chakra.p>
    </Box>
  );
}

function LeftOut({ points }: { points: CraterFit['points'] }) {
  const groups = leftOutByReason(points);
  if (groups.length === 0) return null;
  return (
    <section aria-label="Left out of the line">
      <chakra.h3 mb="1">Left out of the line</chakra.h3>
      <ul>
        {groups.map(({ reason, addresses }) => (
          <li key={reason}>
            <b>{addresses.join(', ')}</b>: {reason}
          </li>
        ))}
      </ul>
    </section>
  );
}

function SaveSpot({ found }: { found: CraterFit }) {
  const { spot, place, notSavableBecause, allowedActions } = found;
  const [isOpen, setIsOpen] = useState(false);
  const announce = useStatusLine();
  if (spot === null || place === null) return null;
  if (notSavableBecause !== null)
    return (
      <chakra.p mt="3" color="fg.muted">
        {notSavableBecause}
      </chakra.p>
    );
  if (!allowedActions.includes('save-spot'))
    return (
      <chakra.p mt="3" color="fg.muted">
        A lead can make this the measured spot of {place.machineName} with {place.lensName}.
      </chakra.p>
    );
  return (
    <>
      <Button
        mt="3"
        whiteSpace="normal"
        height="auto"
        minHeight="touch"
        py="2"
        onClick={() => setIsOpen(true)}
        css={{ '@media print': { display: 'none' } }}
      >
        Save as the measured spot of {place.machineName} with {place.lensName}
      </Button>
      {isOpen && (
        <SaveSpotDialog
          couponId={found.couponId}
          spot={spot}
          place={place}
          onClose={() => setIsOpen(false)}
          onSaved={() => {
            setIsOpen(false);
            announce(`The measured spot of ${place.machineName} with ${place.lensName} is saved.`);
            // the button that opened the dialog is gone
            requestAnimationFrame(() => document.getElementById('content')?.focus());
          }}
        />
      )}
    </>
  );
}

function Look({ isRefused = false, children }: { isRefused?: boolean; children: ReactNode }) {
  return (
    <Flex gap="2" alignItems="start">
      <chakra.span pt="4px" lineHeight="none" color={isRefused ? 'oxide.fg' : 'straw.fg'}>
        <StateShape state={isRefused ? 'fails' : 'caution'} />
      </chakra.span>
      <span>{children}</span>
    </Flex>
  );
}

const isLeftOut = ({ excludedBecause }: CraterFit['points'][number]) => excludedBecause !== null;

function plotWords({ points, pointCount, fit }: CraterFit): string {
  const drawn = `Square of the crater diameter over the logarithm of the pulse energy, ${points.length} craters`;
  if (fit === null) return `${drawn}, no line`;
  const spot = withError(2 * fit.spotRadiusUm, 2 * fit.spotRadiusStandardErrorUm, 'um');
  const threshold = withError(fit.thresholdEnergyUj, fit.thresholdEnergyStandardErrorUj, 'uJ');
  return `${drawn}, a line through ${pointCount} of them with slope ${formatNumber(fit.slopeUm2, { decimals: 0 })} µm²: spot ${spot}, threshold ${threshold}`;
}
