/** A weld that presses to a size is a draw; one that doesn't moves nothing. */
export { traceDraw as traceWeld } from '../draw/index.js';
