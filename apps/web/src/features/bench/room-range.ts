/** Rooms people play in, °C. */
export const roomRange = { leastC: 5, mostC: 35 } as const;
