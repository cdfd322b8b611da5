export { demoWorkshop } from './demo-workshop.js';
export type {
  DemoClearance,
  DemoCoupon,
  DemoHardware,
  DemoKit,
  DemoLicence,
  DemoMark,
  DemoPart,
  DemoPerson,
  DemoPrinter,
  DemoPrintSpec,
  DemoPurchase,
  DemoRevision,
  DemoRole,
  DemoVoice,
  DemoWorkshop,
} from './demo-types.js';
export { generateFiles, type GeneratedFile } from './generate-files.js';
export { demoSignIns, type DemoSignIn } from './sign-ins.js';
