export { mean } from './descriptive/mean';
export { leastSquares } from './linalg/least-squares';
export { type StraightLineFit, straightLineFit } from './regression/straight-line-fit';
