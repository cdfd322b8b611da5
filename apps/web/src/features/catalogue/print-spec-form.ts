import type { PrintSpecification } from '@windchest/contracts';

/** As it stands in a form: the infill in per cent, as slicers show it. */
export type PrintSpecForm = Omit<PrintSpecification, 'infill'> & { infillPercent: number };

export const printSpecForm = ({ infill, ...spec }: PrintSpecification): PrintSpecForm => ({
  ...spec,
  infillPercent: Math.round(infill * 10_000) / 100,
});

export const printSpecBody = ({ infillPercent, ...spec }: PrintSpecForm) => ({
  ...spec,
  infill: infillPercent / 100,
});
