import { chakra, Flex } from '@chakra-ui/react';
import { FactList } from '../../../components/fact-list';
import { Panel } from '../../../components/page';
import { ReadProblem } from '../../../components/read-problem';
import { SkeletonBlock } from '../../../components/skeletons';
import { formatTime } from '../../../lib/format';
import { useSession } from '../../../lib/session';
import { type MachineProfile, useMachineProfiles } from '../machines.api';
import { physicalFacts } from './machine-facts';

/** Every version of the profile. A recipe keeps the one that it was proved on. */
export function ProfileHistory({ machineId }: { machineId: string }) {
  const { data, error, mutate } = useMachineProfiles(machineId);
  if (data === undefined)
    return error === undefined ? (
      <SkeletonBlock height="120px" label="Loading the history" />
    ) : (
      <ReadProblem problem={error} thing="the history" onRetry={() => void mutate()} />
    );
  return (
    <Panel p="5" aria-labelledby="history-title">
      <chakra.h2 id="history-title">Profile history</chakra.h2>
      <chakra.p mb="2" fontSize="sm" lineHeight="sm" color="fg.muted">
        A recipe keeps the version that it was proved on.
      </chakra.p>
      <chakra.ol>
        {data.items.map((profile, index) => (
          <Version key={profile.id} profile={profile} before={data.items[index + 1]} isCurrent={index === 0} />
        ))}
      </chakra.ol>
    </Panel>
  );
}

type VersionProps = { profile: MachineProfile; before: MachineProfile | undefined; isCurrent: boolean };

function Version({ profile, before, isCurrent }: VersionProps) {
  const { timeZone, locale } = useSession().shop;
  return (
    <chakra.li borderTop="hairline">
      <chakra.details>
        <chakra.summary cursor="pointer" py="2.5" minHeight="44px">
          <b>Version {profile.number}</b>
          {isCurrent && <chakra.span color="fg.muted"> in force</chakra.span>}
          <Flex as="span" display="block" fontSize="sm" lineHeight="sm" color="fg.muted">
            {whatChanged(profile, before)} · {profile.createdByName}, {formatTime(profile.createdAt, timeZone)}
          </Flex>
        </chakra.summary>
        <chakra.div pb="3" display="grid" gap="3">
          <FactList facts={physicalFacts(profile.physical, locale)} />
          <chakra.p fontSize="sm" lineHeight="sm">
            <chakra.span color="fg.muted">Panel: </chakra.span>
            {profile.panel.fields.map(({ label }) => label).join(' · ')}
          </chakra.p>
        </chakra.div>
      </chakra.details>
    </chakra.li>
  );
}

function whatChanged({ physicalNumber }: MachineProfile, before: MachineProfile | undefined): string {
  if (before === undefined) return 'first entry';
  return physicalNumber === before.physicalNumber ? 'panel changed' : 'source changed: settings have to be proved again';
}
