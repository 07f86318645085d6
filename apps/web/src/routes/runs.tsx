import { useState } from 'react';
import { Button, ButtonLink } from '../components/button';
import { DownloadIcon } from '../components/icons';
import { Page } from '../components/page';
import { useStatusLine } from '../components/status-line';
import { RunList, useRunFilters } from '../features/runs/components/run-list';
import { runsCsv } from '../features/runs/runs.api';
import { ProblemError } from '../lib/api';
import { paths } from '../lib/paths';
import { saveTextFile } from '../lib/save-file';

export function Component() {
  return (
    <Page
      title="Runs"
      actions={
        <>
          <ButtonLink size="glove" to={paths.requests}>
            Requests for settings
          </ButtonLink>
          <CsvButton />
        </>
      }
    >
      <RunList />
    </Page>
  );
}

function CsvButton() {
  const announce = useStatusLine();
  const [filters] = useRunFilters();
  const [isBusy, setIsBusy] = useState(false);
  const handleClick = async () => {
    setIsBusy(true);
    try {
      saveTextFile('runs.csv', await runsCsv(filters));
    } catch (error) {
      if (!(error instanceof ProblemError)) throw error;
      announce(`The file could not be made. ${error.detail}`);
    } finally {
      setIsBusy(false);
    }
  };
  return (
    <Button size="glove" icon={<DownloadIcon />} isBusy={isBusy} onClick={() => void handleClick()}>
      CSV
    </Button>
  );
}
