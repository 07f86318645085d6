export type { Lab, LinearRgb, Srgb, Xyz } from './colour/colour';
export { colourDifference76 } from './colour/colour-difference-76';
export { colourDifference2000, type DifferenceWeights } from './colour/colour-difference-2000';
export { labFromSrgb } from './colour/lab-from-srgb';
export { labFromXyz } from './colour/lab-from-xyz';
export { linearFromSrgb } from './colour/linear-from-srgb';
export { srgbFromLab } from './colour/srgb-from-lab';
export { COLOUR_WHITE, COLOUR_WHITE_NAME } from './colour/white-point';
export { xyzFromLinearRgb } from './colour/xyz-from-linear-rgb';
export { cellContrast } from './contrast/cell-contrast';
export { michelsonContrast } from './contrast/michelson-contrast';
export { moduleModulation } from './contrast/module-modulation';
export { symbolContrast } from './contrast/symbol-contrast';
export { weberContrastOverDarker, weberContrastOverGround } from './contrast/weber-contrast';
export { type GradedSymbol, symbolGrade } from './grades/symbol-grade';
export {
  SYMBOL_GRADE_LIMITS,
  SYMBOL_PARAMETERS,
  type SymbolGrade,
  type SymbolParameter,
  symbolParameterGrade,
} from './grades/symbol-parameter-grade';
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
