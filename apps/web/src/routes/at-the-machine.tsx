import { useSearchParams } from 'react-router';
import { Page } from '../components/page';
import { WaitingCoupons } from '../features/coupons/mark/waiting-coupons';
import { GrantDeviationButton } from '../features/deviations/forms/grant-deviation';
import { Finder } from '../features/finder/components/finder';
import type { Choice, FinderAnswer, FinderResult } from '../features/finder/finder.api';
import { Holds, PlaceHoldButton } from '../features/holds/components/holds';
import { PartTime } from '../features/marking-time/components/part-time';
import { AskForm } from '../features/requests/forms/ask-form';
import { useSession } from '../lib/session';

export function Component() {
  const { member } = useSession();
  const machineId = useSearchParams()[0].get('machine');
  return (
    <Page title="At the machine" isTitleHidden>
      <Finder
        holds={(answer) => <AnswerHolds answer={answer} />}
        leadActs={(answer) => <LeadActs answer={answer} />}
        time={(answer) => <PartTime revisionId={answer.revisionId} />}
        ask={(choice, result) => <Ask choice={choice} result={result} />}
      />
      {machineId !== null && member.role !== 'trainee' && <WaitingCoupons machineId={machineId} />}
    </Page>
  );
}

function AnswerHolds({ answer }: { answer: FinderAnswer }) {
  return <Holds holds={answer.holds} subjects={subjectsOf(answer)} mayRelease={answer.allowedActions.includes('release-hold')} />;
}

function LeadActs({ answer }: { answer: FinderAnswer }) {
  const from = { revisionId: answer.revisionId, name: `${answer.code} revision ${answer.revisionNumber}` };
  return (
    <>
      {answer.allowedActions.includes('grant-deviation') && <GrantDeviationButton from={from} size="glove" />}
      {answer.allowedActions.includes('place-hold') && <PlaceHoldButton subjects={subjectsOf(answer)} />}
    </>
  );
}

const subjectsOf = ({ recipeId, code, title, machine }: FinderAnswer) => ({ recipe: { id: recipeId, code, title }, machine });

function Ask({ choice: { machine, lens, material, finish, effect, words }, result }: { choice: Choice; result: FinderResult }) {
  return (
    <AskForm
      asked={{
        ...(material === undefined ? {} : { materialId: material }),
        ...(machine === undefined ? {} : { machineId: machine }),
        ...(lens === undefined ? {} : { lensId: lens }),
        ...(finish === undefined ? {} : { finishId: finish }),
        ...(effect === undefined ? {} : { effectId: effect }),
      }}
      materials={result.slots.material.options}
      words={words ?? ''}
    />
  );
}
