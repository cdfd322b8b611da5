import type { KitPart } from '@windchest/contracts';
import { type Bed, type Fit, fitPart } from '@windchest/plates';

export interface PartFit {
  code: string;
  name: string;
  fit: Fit;
}

export interface FitReport {
  /** Parts with a size, in their order. */
  fits: PartFit[];
  /** Codes of parts nobody has measured. */
  unmeasured: string[];
}

const hasSize = ({ sizeMm: { x, y, z } }: KitPart) => x > 0 && y > 0 && z > 0;

/** Whether each part of a kit fits a printer, each by itself and as its orientation rule allows. */
export const fitReport = (parts: readonly KitPart[], bed: Bed): FitReport => ({
  fits: parts.filter(hasSize).map(({ code, name, orientation, sizeMm: { x, y, z } }) => ({
    code,
    name,
    fit: fitPart({ sizeMm: [x, y, z], orientation }, bed),
  })),
  unmeasured: parts.filter((part) => !hasSize(part)).map((part) => part.code),
});
