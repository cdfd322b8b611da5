import type { Clearance, HardwareItem, PrintSpecification, RankVoice } from '@windchest/contracts';

/** What a build book is typeset from: plain facts, nothing to look up. */
export interface BuildBook {
  readonly workshop: { readonly name: string };
  readonly kit: {
    readonly name: string;
    readonly slug: string;
    readonly tagline: string;
    /** sRGB, `#d4682b`; `filamentHex` has those of the palette. */
    readonly colourHex: string;
  };
  readonly revision: { readonly label: string; readonly releasedAt: Date };
  readonly declaredCents: number;
  readonly room: {
    readonly temperatureC: number;
    readonly relativeHumidity?: number;
    readonly a4Hz?: number;
  };
  readonly buildVolume: { readonly xMm: number; readonly yMm: number; readonly zMm: number };
  /** `C5–F6`; empty for a kit without voices. */
  readonly compass: string;
  /** In the order they are listed and drawn. */
  readonly parts: readonly BookPart[];
  /** The rank, lowest first. */
  readonly voices: readonly BookVoice[];
  readonly printSpec: PrintSpecification;
  readonly hardware: readonly HardwareItem[];
  /** Markdown. */
  readonly assemblyNotes: string;
  readonly changeNotes: string;
  readonly cautions: string;
  /** PNG and JPEG pictures of the notes, by the name the notes call them. */
  readonly pictures?: ReadonlyMap<string, Buffer>;
}

export interface BookPart {
  readonly code: string;
  readonly name: string;
  readonly quantity: number;
  /** Printed first: it tells which clearance a printer needs. */
  readonly isGauge: boolean;
  /** The files of a part that comes in several clearances, tightest first; none where it has one. */
  readonly clearances: readonly { readonly clearance: Clearance; readonly fileName: string }[];
  readonly orientation: 'as-exported' | 'may-turn' | 'may-lie';
  /** x, y, z as the part stands in its file. */
  readonly sizeMm: readonly [number, number, number] | null;
  readonly volumeCm3: number | null;
  readonly drawing: PartDrawing | null;
  /** Only where it differs from the book's. */
  readonly printSpec: PrintSpecification | null;
}

/** SVG paths in mm: the silhouette with its holes (even-odd), and the edges seen inside it. */
export interface PartDrawing {
  readonly path: string;
  readonly edges: string;
  readonly viewBox: string;
  readonly widthMm: number;
  readonly heightMm: number;
}

export interface BookVoice {
  readonly code: string;
  /** `C#5` or `C♯5`. */
  readonly note: string;
  readonly kind: RankVoice['voice']['kind'];
  /** In words with units: `bore 11 mm, wall 1.6 mm`. */
  readonly dimensions: string;
  /** What sounds; null for a vessel. */
  readonly lengthMm: number | null;
  /** As it is drawn: a pipe's outer width, a bar's width, a vessel's diameter. */
  readonly widthMm: number;
  /** Null where the formulas do not reach. */
  readonly predicted: {
    readonly hz: number;
    readonly cents: number;
    readonly uncertaintyCents: number;
  } | null;
}
