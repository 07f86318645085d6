import { chakra, Flex } from '@chakra-ui/react';
import { useState } from 'react';
import { Button } from '../../../components/button';
import { DownloadIcon } from '../../../components/icons';
import { Segmented } from '../../../components/segmented';
import { useStatusLine } from '../../../components/status-line';
import { ProblemError } from '../../../lib/api';
import { type Coupon, downloadArtwork, downloadCells, type Polarity } from '../coupons.api';

const POLARITIES = [
  { value: 'dark on bright', label: 'Dark on bright' },
  { value: 'bright on dark', label: 'Bright on dark' },
] as const;

/** Artwork and cell list of a stored plan. */
export function CouponDownloads({ coupon }: { coupon: Pick<Coupon, 'id' | 'code'> }) {
  const [polarity, setPolarity] = useState<Polarity>('dark on bright');
  const [busy, setBusy] = useState<'artwork' | 'cells'>();
  const announce = useStatusLine();
  const save = async (what: 'artwork' | 'cells') => {
    setBusy(what);
    try {
      await (what === 'artwork' ? downloadArtwork(coupon, polarity) : downloadCells(coupon));
    } catch (error) {
      if (!(error instanceof ProblemError)) throw error;
      announce(`The file was not made. ${error.detail}`);
    } finally {
      setBusy(undefined);
    }
  };
  return (
    <chakra.section aria-label="Files for the machine" display="grid" gap="2">
      <Segmented
        label="What the laser does to the ground"
        choices={POLARITIES}
        value={polarity}
        onChange={setPolarity}
        isWide
        size="glove"
      />
      <Flex gap="2" wrap="wrap">
        <Button size="glove" flex="1" icon={<DownloadIcon />} isBusy={busy === 'artwork'} onClick={() => void save('artwork')}>
          Artwork, SVG
        </Button>
        <Button size="glove" flex="1" icon={<DownloadIcon />} isBusy={busy === 'cells'} onClick={() => void save('cells')}>
          Cells, CSV
        </Button>
      </Flex>
    </chakra.section>
  );
}
