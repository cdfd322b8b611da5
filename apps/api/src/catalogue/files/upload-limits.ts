import { Refusal } from '../../http/refusal.js';

const UNITS = ['bytes', 'KiB', 'MiB', 'GiB'] as const;

/** A size as people read it, in binary units. */
export const readableBytes = (bytes: number): string => {
  const step = bytes > 0 ? Math.min(Math.floor(Math.log2(bytes) / 10), UNITS.length - 1) : 0;
  const value = bytes / 1024 ** step;
  return `${Number.isInteger(value) ? value : value.toFixed(1)} ${UNITS[step]}`;
};

/** @throws Refusal `file-too-large` */
export const assertFileFits = (fileName: string, bytes: number, limitBytes: number): void => {
  if (bytes > limitBytes)
    throw new Refusal(
      'file-too-large',
      `“${fileName}” is larger than ${readableBytes(limitBytes)}, the most that one file may have. Send a smaller export.`,
    );
};

/** @throws Refusal `revision-too-large` */
export const assertRevisionFits = (fileName: string, wouldBeBytes: number, limitBytes: number): void => {
  if (wouldBeBytes > limitBytes)
    throw new Refusal(
      'revision-too-large',
      `With “${fileName}” this revision would hold more than ${readableBytes(limitBytes)}, the most it may. Take a file out first.`,
    );
};
