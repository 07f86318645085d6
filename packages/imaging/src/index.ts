export { ARUCO_MODULES_PER_SIDE, arucoModules, type FiducialId } from './grid/aruco-4x4';
export { cellAddress, MAX_COLUMNS, MAX_ROWS, parseCellAddress, rowLetter } from './grid/cell-address';
export { type ArtworkCell, type CouponArtworkOptions, couponArtworkSvg } from './grid/coupon-artwork';
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
export { type CouponMarks, type CouponMarksOptions, couponMarks, type MarkPolarity, type StrokesMm } from './grid/coupon-marks';
export { letteringStrokesMm, letteringWidthMm, type PointMm } from './grid/single-line-lettering';
