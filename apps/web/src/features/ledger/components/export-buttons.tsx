import { useState } from 'react';
import { useSearchParams } from 'react-router';
import { Button } from '../../../components/button';
import { DownloadIcon } from '../../../components/icons';
import { useStatusLine } from '../../../components/status-line';
import { ProblemError } from '../../../lib/api';
import { downloadLedger } from '../ledger.api';
import { filtersFromAddress } from '../ledger-filters';

const FORMS = [
  { form: 'csv', label: 'CSV' },
  { form: 'json', label: 'JSON' },
] as const;

/** What the list shows, all of it, as a file. */
export function ExportButtons() {
  const [search] = useSearchParams();
  const announce = useStatusLine();
  const [busy, setBusy] = useState<'csv' | 'json'>();
  const handleSave = async (form: 'csv' | 'json') => {
    setBusy(form);
    try {
      await downloadLedger(form, filtersFromAddress(search));
    } catch (error) {
      if (!(error instanceof ProblemError)) throw error;
      announce(`The file was not made. ${error.detail}`);
    } finally {
      setBusy(undefined);
    }
  };
  return FORMS.map(({ form, label }) => (
    <Button
      key={form}
      icon={<DownloadIcon />}
      isBusy={busy === form}
      aria-label={`Export as ${label}`}
      onClick={() => void handleSave(form)}
    >
      {label}
    </Button>
  ));
}
