import { chakra } from '@chakra-ui/react';
import type { Coupon, CouponCell } from '../../coupons.api';
import { type ShownSetting, shownSettings } from '../cell-words';

/** The setting of the cell in two columns; what was really used stands first, the plan under it where it differs. */
export function CellSettings({ coupon, cell, decimalSign }: { coupon: Coupon; cell: CouponCell; decimalSign: '.' | ',' }) {
  const ofGrid = coupon.cells.filter(({ gridId }) => gridId === cell.gridId).length;
  const rows = [
    ...shownSettings(cell, coupon, decimalSign),
    { key: 'run-order', label: 'Run order', value: String(cell.runOrder), unit: `of ${ofGrid}` },
  ];
  return (
    <chakra.dl display="grid" gridTemplateColumns="1fr 1fr" columnGap={{ base: '5', sm: '8' }} fontSize="sm" lineHeight="sm">
      {rows.map((row) => (
        <Row key={row.key} row={row} />
      ))}
    </chakra.dl>
  );
}

function Row({ row: { label, value, unit, planned } }: { row: ShownSetting }) {
  return (
    <chakra.div display="flex" justifyContent="space-between" flexWrap="wrap" columnGap="3" py="1" minW="0">
      <chakra.dt color="fg.muted">{label}</chakra.dt>
      <chakra.dd textAlign="right" fontWeight="semibold" ml="auto">
        {value}
        {unit !== '' && <chakra.span fontWeight="normal" color="fg.muted">{` ${unit}`}</chakra.span>}
      </chakra.dd>
      {planned !== undefined && (
        <chakra.dd width="full" textAlign="right" color="straw.fg">
          planned {planned}
        </chakra.dd>
      )}
    </chakra.div>
  );
}
