import type { HardwareItem, RevisionDetail } from '@windchest/contracts';
import { type PrintSpecForm, printSpecBody, printSpecForm } from './print-spec-form.js';

export interface SpecificationForm {
  printSpec: PrintSpecForm;
  buildVolume: RevisionDetail['buildVolume'];
  declaredCents: number;
  room: RevisionDetail['room'];
  hardware: HardwareItem[];
  cautions: string;
}

export const specificationForm = (revision: RevisionDetail): SpecificationForm => ({
  printSpec: printSpecForm(revision.printSpec),
  buildVolume: revision.buildVolume,
  declaredCents: revision.declaredCents,
  room: revision.room,
  hardware: revision.hardware,
  cautions: revision.cautions,
});

export const specificationBody = (form: SpecificationForm): unknown => ({
  ...form,
  printSpec: printSpecBody(form.printSpec),
});

export const emptyHardware: HardwareItem = { quantity: 1, unit: '', name: '', remark: '' };
