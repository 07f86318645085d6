import { useParams } from 'react-router';
import { TransferPage } from '../features/recipes/transfer/transfer-page';

export function Component() {
  const { code = '', revisionId = '' } = useParams();
  return <TransferPage key={revisionId} code={code} revisionId={revisionId} />;
}
