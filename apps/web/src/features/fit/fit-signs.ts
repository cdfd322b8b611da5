/** Signs of a report's state: what waits for the workshop stands out. */
export const fitSigns = {
  new: 'warn',
  answered: 'note',
  planned: 'wait',
  fixed: 'ok',
  closed: 'none',
} as const;
