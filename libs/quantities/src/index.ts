export { OutOfRangeError } from './out-of-range-error.js';
