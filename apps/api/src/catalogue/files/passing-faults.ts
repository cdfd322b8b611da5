/** Faults of the work on a mesh, not of its file: sending the file again tries again. */
export const passingFaults = ['timed-out', 'out-of-memory', 'worker-ended'] as const;
export type PassingFault = (typeof passingFaults)[number];
