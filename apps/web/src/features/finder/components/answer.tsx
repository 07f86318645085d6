import { chakra } from '@chakra-ui/react';
import type { ReactNode } from 'react';
import { ActBar } from '../../../components/act-bar';
import { Button, ButtonLink } from '../../../components/button';
import { FactList } from '../../../components/fact-list';
import { PrintIcon, StartIcon } from '../../../components/icons';
import { FoldedNumbers } from '../../../components/numbers-panel/folded-numbers';
import { Panel } from '../../../components/page';
import { SettingCard } from '../../../components/setting-card';
import { revisionNumbers } from '../../../components/setting-numbers';
import { besidePanel, settingRows, stepTitle } from '../../../components/setting-rows';
import { SignatureLine } from '../../../components/signature-line';
import { formatDate, formatNumber, formatTime, inShopLength, shopLengthUnit } from '../../../lib/format';
import { settingTick, useKeptTicks } from '../../../lib/kept-ticks';
import { paths } from '../../../lib/paths';
import { decimalSignOf } from '../../../lib/read-number';
import { useSession } from '../../../lib/session';
import type { FinderAnswer } from '../finder.api';
import { MarkToMatch } from './mark-to-match';
import { SetUpSteps } from './set-up-steps';

/** The approved setting as it is dialled in: card, mark to match, set-up, signature, acts. */
export function Answer({ answer, time }: { answer: FinderAnswer; time: ReactNode }) {
  const { ticks, setTick } = useKeptTicks(answer.revisionId);
  return (
    <div>
      <chakra.div
        display="grid"
        gridTemplateColumns={{ base: 'minmax(0, 1fr)', lg: 'minmax(0, 1.14fr) minmax(0, 1fr)' }}
        gap={{ base: '4', lg: '6' }}
        alignItems="start"
      >
        <chakra.div display="grid" gap="4" minW="0">
          <SettingCards answer={answer} ticks={ticks} onTick={setTick} />
          <FoldedNumbers summary="Numbers behind this setting" label="Numbers behind this setting" groups={revisionNumbers(answer)} />
          {time}
        </chakra.div>
        <chakra.div display="grid" gap="4">
          {answer.reference !== null && <MarkToMatch reference={answer.reference} />}
          {answer.setUpSteps.length > 0 && <SetUpSteps steps={answer.setUpSteps} ticks={ticks} onTick={setTick} />}
          <Beside answer={answer} />
        </chakra.div>
      </chakra.div>
      <chakra.div display={{ base: 'block', sm: 'none' }} mt="4">
        <Signature answer={answer} />
      </chakra.div>
      <ActBar lead={<Signature answer={answer} />} isInFlowOnPhone>
        <SheetAct answer={answer} />
        <StartAct answer={answer} />
      </ActBar>
    </div>
  );
}

type Ticked = { ticks: ReadonlySet<string>; onTick: (key: string, isTicked: boolean) => void };

function SettingCards({ answer, ticks, onTick }: { answer: FinderAnswer } & Ticked) {
  const { shop } = useSession();
  const { steps, panel, machine, code, revisionNumber, isOverdue } = answer;
  return (
    <chakra.div display="grid" gap="4" minW="0">
      {steps.map((step, index) => {
        const prefix = settingTick(index, '');
        const own = new Set([...ticks].filter((key) => key.startsWith(prefix)).map((key) => key.slice(prefix.length)));
        const order = `In the order of ${machine.name}’s panel`;
        return (
          <SettingCard
            // Steps have no names of their own; their place is what they are known by.
            key={prefix}
            code={code}
            revision={revisionNumber}
            state={isOverdue ? 'reproveDue' : 'approved'}
            caption={steps.length === 1 ? order : `${stepTitle(step, index, steps.length)}. ${order}`}
            rows={settingRows(step, panel, decimalSignOf(shop.locale))}
            ticked={own}
            onTick={(key, isTicked) => onTick(settingTick(index, key), isTicked)}
          />
        );
      })}
    </chakra.div>
  );
}

/** What belongs to the setting but stands on no field of the panel. */
function Beside({ answer: { steps, panel, focus } }: { answer: FinderAnswer }) {
  const { shop } = useSession();
  const focusFacts = [
    ...(focus?.workingDistanceMm == null
      ? []
      : [{ label: 'Working distance', value: formatNumber(inShopLength(focus.workingDistanceMm)), unit: shopLengthUnit() }]),
    ...(focus === null || focus.focusMethod === '' ? [] : [{ label: 'Focus found by', value: focus.focusMethod }]),
  ];
  return (
    <Panel px="5" py="2" aria-label="Beside the panel">
      {steps.map((step, index) => (
        <chakra.div key={settingTick(index, '')}>
          {steps.length > 1 && <chakra.h3 pt="2">{stepTitle(step, index, steps.length)}</chakra.h3>}
          <FactList facts={[...besidePanel(step, panel, decimalSignOf(shop.locale)), ...(index === 0 ? focusFacts : [])]} />
        </chakra.div>
      ))}
    </Panel>
  );
}

function Signature({ answer }: { answer: FinderAnswer }) {
  const { shop } = useSession();
  const { signature, holdsUntil, isOverdue } = answer;
  if (signature === null) return null;
  const byAuthor = signature.isByAuthor ? ', signed by its author' : '';
  const until =
    holdsUntil === null ? '' : ` ${isOverdue ? 'Was to be proved again by' : 'Holds until'} ${formatDate(holdsUntil, shop.timeZone)}.`;
  return (
    <SignatureLine
      name={signature.printedName}
      state={isOverdue ? 'reproveDue' : 'approved'}
      caption={`Approved for use${byAuthor}, ${formatTime(signature.signedAt, shop.timeZone)}.${until}`}
    />
  );
}

function SheetAct({ answer }: { answer: FinderAnswer }) {
  if (answer.blockedBecause.length > 0)
    return (
      <Button size="glove" icon={<PrintIcon />} disabled>
        <SheetWords />
      </Button>
    );
  return (
    <ButtonLink to={paths.setUpSheet(answer.recipeId)} size="glove" icon={<PrintIcon />}>
      <SheetWords />
    </ButtonLink>
  );
}

function StartAct({ answer }: { answer: FinderAnswer }) {
  if (!answer.allowedActions.includes('start-run'))
    return (
      <Button kind="primary" size="primaryAct" icon={<StartIcon />} disabled>
        Start a run
      </Button>
    );
  return (
    <ButtonLink to={paths.startRun(answer.revisionId)} kind="primary" size="primaryAct" icon={<StartIcon />}>
      Start a run
    </ButtonLink>
  );
}

/** Two acts share a phone's width. */
function SheetWords() {
  return (
    <span>
      Print <chakra.span display={{ base: 'none', sm: 'inline' }}>set-up </chakra.span>sheet
    </span>
  );
}
