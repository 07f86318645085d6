import * as imaging from './index';

it('exports exactly these names', () => {
  expect(Object.keys(imaging).sort()).toEqual([
    'ARUCO_MODULES_PER_SIDE',
    'COUPON_LAYOUT_VERSION',
    'MAX_COLUMNS',
    'MAX_ROWS',
    'arucoModules',
    'cellAddress',
    'couponArtworkSvg',
    'couponLayout',
    'couponMarks',
    'letteringStrokesMm',
    'letteringWidthMm',
    'parseCellAddress',
    'rowLetter',
  ]);
});
