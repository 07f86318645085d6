import { chakra } from '@chakra-ui/react';
import { useState } from 'react';
import { Button } from '../../../components/button';
import { StopBanner } from '../../../components/stop-banner';
import { formatTime } from '../../../lib/format';
import { useSession } from '../../../lib/session';
import { PlaceHoldDialog, ReleaseHoldDialog } from '../forms/hold-dialogs';
import { type HoldSubjects, type OpenHold, subjectName } from '../holds.api';

export type HoldsProps = { holds: readonly OpenHold[]; subjects: HoldSubjects; mayRelease: boolean };

/** Open holds, before everything else on the page. */
export function Holds({ holds, subjects, mayRelease }: HoldsProps) {
  const { shop } = useSession();
  const [releasing, setReleasing] = useState<OpenHold>();
  if (holds.length === 0) return null;
  return (
    <>
      <chakra.div role="alert">
        <chakra.ul display="grid" gap="2">
          {holds.map((hold) => (
            <li key={hold.id}>
              <StopBanner
                title={`${subjectName(subjects, hold.subject)} is on hold. Start no run.`}
                actions={
                  mayRelease && (
                    <Button size="glove" onClick={() => setReleasing(hold)}>
                      Release the hold
                    </Button>
                  )
                }
              >
                <p>{hold.reason}</p>
                <chakra.p fontSize="sm" lineHeight="sm" color="fg.muted">
                  Placed by {hold.placedBy}
                  {hold.placedAt === undefined ? '' : `, ${formatTime(hold.placedAt, shop.timeZone)}`}. A lead can release it.
                </chakra.p>
              </StopBanner>
            </li>
          ))}
        </chakra.ul>
      </chakra.div>
      {releasing !== undefined && <ReleaseHoldDialog hold={releasing} onClose={() => setReleasing(undefined)} />}
    </>
  );
}

export type PlaceHoldButtonProps = { subjects: HoldSubjects; size?: 'control' | 'glove' };

/** A lead stops the use from where it is seen. */
export function PlaceHoldButton({ subjects, size = 'glove' }: PlaceHoldButtonProps) {
  const [isOpen, setIsOpen] = useState(false);
  return (
    <>
      <Button kind="danger" size={size} onClick={() => setIsOpen(true)}>
        Place a hold
      </Button>
      {isOpen && <PlaceHoldDialog subjects={subjects} onClose={() => setIsOpen(false)} />}
    </>
  );
}
