export { ARUCO_MODULES_PER_SIDE, arucoModules, type FiducialId } from './grid/aruco-4x4';
export { cellAddress, MAX_COLUMNS, MAX_ROWS, parseCellAddress, rowLetter } from './grid/cell-address';
export {
  COUPON_LAYOUT_VERSION,
  type CouponLayout,
  type CouponLayoutOptions,
  couponLayout,
  type LayoutCell,
  type LayoutFiducial,
  type LayoutLabel,
  type RectMm,
} from './grid/coupon-layout';
export { letteringStrokesMm, letteringWidthMm, type PointMm } from './grid/single-line-lettering';
