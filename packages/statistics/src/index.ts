export { mean } from './descriptive/mean';
