export { mean } from './descriptive/mean';
export { leastSquares } from './linalg/least-squares';
