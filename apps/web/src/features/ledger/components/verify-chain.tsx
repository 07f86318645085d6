import { chakra } from '@chakra-ui/react';
import { useState } from 'react';
import { Button } from '../../../components/button';
import { LedgerIcon } from '../../../components/icons';
import { Panel } from '../../../components/page';
import { ProblemNotice } from '../../../components/problem-notice';
import { StateMark } from '../../../components/state-mark';
import { ProblemError } from '../../../lib/api';
import { type Verification, verifyChain } from '../ledger.api';
import { breakWords, intactWords } from '../verification-words';

/** Recomputes every hash of the shop's chain on the server and says in words what came of it. */
export function VerifyChain() {
  const [isBusy, setIsBusy] = useState(false);
  const [result, setResult] = useState<Verification>();
  const [problem, setProblem] = useState<ProblemError>();
  const handleVerify = async () => {
    setIsBusy(true);
    setProblem(undefined);
    try {
      setResult(await verifyChain());
    } catch (error) {
      if (!(error instanceof ProblemError)) throw error;
      setResult(undefined);
      setProblem(error);
    } finally {
      setIsBusy(false);
    }
  };
  return (
    <Panel p="5" aria-labelledby="chain-title">
      <chakra.div display="flex" flexWrap="wrap" gap="4" alignItems="center" justifyContent="space-between">
        <chakra.div maxW="prose">
          <chakra.h2 id="chain-title">The chain</chakra.h2>
          <chakra.p color="fg.muted">
            Each event carries the hash of the one before it. Whoever changes or removes one breaks every link after it.
          </chakra.p>
        </chakra.div>
        <Button icon={<LedgerIcon />} isBusy={isBusy} onClick={() => void handleVerify()}>
          Verify the chain
        </Button>
      </chakra.div>
      <chakra.div role="status" mt={result === undefined && problem === undefined ? '0' : '4'}>
        {result?.isIntact === true && <Intact result={result} />}
        {result?.isIntact === false && <ProblemNotice {...breakWords(result)} />}
        {problem !== undefined && (
          <ProblemNotice what="The chain was not verified." safe="That says nothing about the chain itself." todo={problem.detail} />
        )}
      </chakra.div>
    </Panel>
  );
}

function Intact({ result }: { result: Verification }) {
  return (
    <>
      <StateMark state="passes">Intact</StateMark>
      <chakra.p mt="1">{intactWords(result)}</chakra.p>
      <chakra.p fontSize="sm" color="fg.muted" overflowWrap="anywhere">
        Hash of the last event:{' '}
        <chakra.code fontFamily="mono" fontSize="sm" color="fg">
          {result.headHash}
        </chakra.code>
      </chakra.p>
    </>
  );
}
