import { chakra } from '@chakra-ui/react';
import { Panel } from '../../../components/page';
import { ReadProblem } from '../../../components/read-problem';
import { SkeletonBlock } from '../../../components/skeletons';
import { type Deviation, useDeviations } from '../deviations.api';
import { type DeviationFrom, GrantDeviationButton } from '../forms/grant-deviation';
import { DeviationList } from './deviation-list';

export type DeviationsPanelProps = { from: DeviationFrom; mayGrant: boolean };

/** On a recipe's page: every departure from its approved revision, those that have ended behind a tap. */
export function DeviationsPanel({ from, mayGrant }: DeviationsPanelProps) {
  const { data, error, mutate } = useDeviations(from.revisionId);
  const live = data?.items.filter(({ isLive }) => isLive) ?? [];
  const ended = data?.items.filter(({ isLive }) => !isLive) ?? [];
  return (
    <Panel px="5" py="4" aria-label="Deviations" display="grid" gap="3">
      <h2>Deviations</h2>
      {data === undefined ? (
        error === undefined ? (
          <SkeletonBlock height="64px" label="Loading the deviations" />
        ) : (
          <ReadProblem problem={error} thing="the deviations" onRetry={() => void mutate()} />
        )
      ) : live.length === 0 ? (
        <chakra.p color="fg.muted">None may be used now: parts are marked as the setting says.</chakra.p>
      ) : (
        <DeviationList deviations={live} />
      )}
      <Ended deviations={ended} />
      {mayGrant && <GrantDeviationButton from={from} />}
    </Panel>
  );
}

function Ended({ deviations }: { deviations: readonly Deviation[] }) {
  if (deviations.length === 0) return null;
  return (
    <details>
      <chakra.summary cursor="pointer" minHeight={{ base: 'touch', lg: '8' }} alignContent="center" color="brand.fg">
        {deviations.length} ended
      </chakra.summary>
      <DeviationList deviations={deviations} />
    </details>
  );
}

export type StartDeviationsProps = DeviationsPanelProps & { deviations: readonly Deviation[] };

/** Before a run: those that it may cite, and for a lead the way to another one. */
export function StartDeviations({ from, mayGrant, deviations }: StartDeviationsProps) {
  if (deviations.length === 0 && !mayGrant) return null;
  return (
    <Panel px="5" py="4" aria-label="Deviations" display="grid" gap="3">
      <h2>Deviations</h2>
      {deviations.length === 0 ? (
        <chakra.p color="fg.muted">None may be used now: parts are marked as the setting says.</chakra.p>
      ) : (
        <DeviationList deviations={deviations} />
      )}
      {mayGrant && <GrantDeviationButton from={from} size="glove" />}
    </Panel>
  );
}
