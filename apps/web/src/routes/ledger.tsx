import { Box } from '@chakra-ui/react';
import { Page } from '../components/page';
import { ExportButtons } from '../features/ledger/components/export-buttons';
import { LedgerList } from '../features/ledger/components/ledger-list';
import { VerifyChain } from '../features/ledger/components/verify-chain';
import { useSession } from '../lib/session';

export function Component() {
  const { member } = useSession();
  const mayVerify = member.role === 'lead' || member.role === 'owner';
  return (
    <Page
      title="Ledger"
      meta={<span>Everything that was done here, with who and when. Nobody can change it.</span>}
      actions={mayVerify && <ExportButtons />}
    >
      {mayVerify && (
        <Box mb="5">
          <VerifyChain />
        </Box>
      )}
      <LedgerList />
    </Page>
  );
}
