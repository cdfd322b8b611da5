import type { Voice } from '@windchest/voicing';
import type { Solid } from './geometry/solid.js';

export type FilamentColour = 'orange' | 'teal' | 'violet' | 'ochre' | 'blue' | 'rose' | 'moss';
export type OrientationRule = 'as-exported' | 'may-turn' | 'may-lie';
export type LicenceKind = 'personal' | 'small-run' | 'classroom';
/** A gap smaller or larger than drawn: such a part fits tighter or looser. */
export type DemoClearance = 'minus' | 'plus';
export type DemoRole = 'owner' | 'maker' | 'helper' | 'bookkeeper' | 'buyer';

/** A voice with the note it is meant to give; `widthMm` is for drawing a bar or tine, it changes no pitch. */
export type DemoVoice = Voice & { note: string; widthMm?: number };

export interface DemoPrintSpec {
  nozzleMm: number;
  layerMm: number;
  perimeters: number;
  topLayers: number;
  bottomLayers: number;
  /** 0..1 */
  infill: number;
  material: string;
  supports: 'none';
  remarks: string;
}

export interface DemoPart {
  code: string;
  name: string;
  quantity: number;
  orientation: OrientationRule;
  /** Only where it differs from the revision's. */
  printSpec: DemoPrintSpec | null;
  voice: DemoVoice | null;
  /** Printed first: it tells which clearance fits a printer. */
  isGauge: boolean;
  fileName: string;
  fileFormat: 'stl' | '3mf';
  /** The part in other clearances; its own file is the zero. */
  variants: { clearance: DemoClearance; fileName: string }[];
}

export interface DemoHardware {
  quantity: number;
  unit: string;
  name: string;
  remark: string;
}

/** What buyers of an earlier revision should do about a changed part. */
export interface DemoMark {
  code: string;
  mark: 'reprint needed' | 'reprint if it troubles you';
  reason: string;
}

export interface DemoRevision {
  mark: number;
  issue: number;
  /** `Mk 1.0` */
  label: string;
  state: 'released';
  assemblyNotes: string;
  changeNotes: string;
  cautions: string;
  printSpec: DemoPrintSpec;
  hardware: DemoHardware[];
  buildVolume: { xMm: number; yMm: number; zMm: number };
  declaredCents: number;
  room: { temperatureC: number };
  parts: DemoPart[];
  marks: DemoMark[];
}

export interface DemoLicence {
  kind: LicenceKind;
  name: string;
  terms: string;
  priceMinor: number;
  yearlyLimit: number | null;
}

export interface DemoKit {
  slug: string;
  name: string;
  tagline: string;
  description: string;
  colour: FilamentColour;
  licences: DemoLicence[];
  /** Oldest first. */
  revisions: DemoRevision[];
}

export interface DemoCoupon {
  code: string;
  label: string;
  off: { kind: 'fraction'; numerator: number; denominator: number } | { kind: 'amount'; minor: number };
  kitSlugs: string[];
  cap: number | null;
  perBuyer: number | null;
  isAnnounced: boolean;
}

export interface DemoPerson {
  role: DemoRole;
  name: string;
  email: string;
  countryCode: string;
  isVerified: boolean;
}

/** A printer of a buyer; the first one of each is the main one. */
export interface DemoPrinter {
  ownerEmail: string;
  name: string;
  bed: { xMm: number; yMm: number; zMm: number };
  nozzleMm: number;
  materials: { material: string; pricePerKgMinor: number | null }[];
  clearance: 'minus' | 'zero' | 'plus' | null;
}

export interface DemoPurchase {
  buyerEmail: string;
  lines: { kitSlug: string; licence: LicenceKind }[];
  couponCode: string | null;
  /** The newest revision of the first kit when it was bought, and so the one the buyer holds. */
  boughtAt: string;
  /** Of one line, a part that the bookkeeper gave back; the files stay. */
  givenBack?: { kitSlug: string; minor: number; reason: string };
  business?: { name: string; address: string; vatNumber: string };
  /** Then the files are not the buyer's. */
  gift?: { email: string; giver: string; greeting: string };
  /** Where billing address and card are from, where that is not the buyer's country. */
  paidFrom?: { billing: string; card: string };
}

export interface DemoPlan {
  name: string;
  words: string;
  amountMinor: number;
  /** None: all kits, and those to come. */
  kitSlugs: string[] | null;
  keepsAfter: 'nothing' | 'released-during' | 'released-before-end';
}

export interface DemoPledge {
  supporterEmail: string;
  planName: string;
  /** Its end is asked for already: it runs out with the month. */
  isEnding: boolean;
}

/** What somebody has printed of the revision they hold: all of it, but for these. */
export interface DemoPrints {
  buyerEmail: string;
  kitSlug: string;
  /** Codes of parts of which there is no piece yet. */
  notYet: string[];
  /** Pieces that are there of parts that are begun, by code. */
  begun: { [code: string]: number };
}

export interface DemoFitReport {
  buyerEmail: string;
  kitSlug: string;
  /** Which part of the revision held, in the order of their codes. */
  partIndex: number;
  printerName: string;
  nozzleMm: number;
  layerMm: number;
  material: string;
  verdict: 'far-too-tight' | 'tight' | 'right' | 'loose' | 'far-too-loose';
  gapMm: number | null;
  words: string;
  answer: string | null;
}

export interface DemoPost {
  title: string;
  slug: string;
  lead: string;
  body: string;
  audience: 'everybody' | 'supporters';
  kitSlug: string | null;
}

export interface DemoWorkshop {
  workshop: {
    name: string;
    motto: string;
    about: string;
    currency: 'EUR';
    countryCode: string;
    legalName: string;
    addressLines: string[];
    email: string;
  };
  people: DemoPerson[];
  printers: DemoPrinter[];
  kits: DemoKit[];
  coupons: DemoCoupon[];
  purchases: DemoPurchase[];
  plans: DemoPlan[];
  pledges: DemoPledge[];
  posts: DemoPost[];
  prints: DemoPrints[];
  fitReports: DemoFitReport[];
  newsReaders: string[];
  letters: DemoLetter[];
}

/** A letter of the workshop; what is not sent stays a draft. */
export interface DemoLetter {
  kind: 'service' | 'news';
  subject: string;
  body: string;
  kitSlug: string | null;
  isSent: boolean;
}

/** A part together with what draws its mesh. */
export interface PlannedPart {
  part: DemoPart;
  shape: () => Solid;
  variantShapes: Partial<Record<DemoClearance, () => Solid>>;
}

export interface KitPlan {
  kit: DemoKit;
  /** By revision label. */
  planned: ReadonlyMap<string, readonly PlannedPart[]>;
}
