import type { DemoLicence } from '../demo-types.js';

export const personalLicence = (priceMinor: number): DemoLicence => ({
  kind: 'personal',
  name: 'For my own prints',
  terms:
    'Print the kit as often as you like, for yourself and as presents. You may change the parts for your own use. You may not pass the files on, and you may not sell prints. All later revisions of the kit are yours.',
  priceMinor,
  yearlyLimit: null,
});

export const smallRunLicence = (priceMinor: number, yearlyLimit: number): DemoLicence => ({
  kind: 'small-run',
  name: `To sell up to ${yearlyLimit} prints a year`,
  terms: `Print and sell up to ${yearlyLimit} instruments in a calendar year, from one workshop. Name the kit and Saltmarsh Sound Works where you sell them. You answer for the safety of what you sell. You may not pass the files on. All later revisions of the kit are yours.`,
  priceMinor,
  yearlyLimit,
});

export const classroomLicence = (priceMinor: number): DemoLicence => ({
  kind: 'classroom',
  name: 'For a school or club',
  terms:
    'One school, club or library may print the kit for the people it teaches, who keep what they build. Teachers and helpers there may hold the files; they may not pass them on or sell prints. All later revisions of the kit are yours.',
  priceMinor,
  yearlyLimit: null,
});
