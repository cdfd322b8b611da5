import { estimateKit } from './estimate-kit.js';

/** What a worker thread runs for each kit: packing its plates takes seconds. */
export default estimateKit;
