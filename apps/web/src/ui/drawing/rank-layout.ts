export type DrawnVoiceKind = 'stopped-pipe' | 'open-pipe' | 'free-bar' | 'tine' | 'string' | 'vessel';

/** A voice as it is drawn. `widthMm`: a pipe's outer width, a bar's width, a vessel's diameter. */
export interface DrawnVoice {
  key: string;
  label: string;
  kind: DrawnVoiceKind;
  lengthMm: number;
  widthMm: number;
}

export interface ExtentMm {
  widthMm: number;
  heightMm: number;
}

/** A string is a line: fingers, and pointers, need room between two of them. */
const leastSlotMm = (kind: DrawnVoiceKind) => (kind === 'string' ? 10 : 6);
const leastGapMm = 1.2;

interface Slot {
  voice: DrawnVoice;
  xMm: number;
  slotMm: number;
}

/** Voices side by side in their order, a gap of a little more than a quarter of their mean width between them. */
function slotsOf(voices: readonly DrawnVoice[]): { slots: Slot[]; widthMm: number } {
  const meanMm = voices.reduce((sum, voice) => sum + voice.widthMm, 0) / Math.max(1, voices.length);
  const gapMm = Math.max(leastGapMm, meanMm * 0.28);
  let xMm = 0;
  const slots = voices.map((voice) => {
    const slotMm = Math.max(leastSlotMm(voice.kind), voice.widthMm + gapMm);
    const slot = { voice, xMm: xMm + (slotMm - voice.widthMm) / 2, slotMm };
    xMm += slotMm;
    return slot;
  });
  return { slots, widthMm: xMm };
}

/** How much room a rank takes on paper, at 1 : 1. */
export const extentOf = (voices: readonly DrawnVoice[]): ExtentMm => ({
  widthMm: slotsOf(voices).widthMm,
  heightMm: Math.max(0, ...voices.map((voice) => voice.lengthMm)),
});

/** The room that holds each of several ranks, so that all can be drawn to one scale. */
export const extentOfAll = (ranks: readonly (readonly DrawnVoice[])[]): ExtentMm => {
  const extents = ranks.map(extentOf);
  return {
    widthMm: Math.max(0, ...extents.map((one) => one.widthMm)),
    heightMm: Math.max(0, ...extents.map((one) => one.heightMm)),
  };
};

export interface PlacedVoice {
  voice: DrawnVoice;
  /** The drawn body. */
  x: number;
  y: number;
  width: number;
  height: number;
  /** Where it can be pressed: its whole slot. */
  slotX: number;
  slotWidth: number;
}

export interface RankLayout {
  pxPerMm: number;
  voices: PlacedVoice[];
  widthPx: number;
  heightPx: number;
}

/** Places a rank in px so that `extent` (its own, or that of all ranks of a list) fits the room given. */
export function layOutRank(
  voices: readonly DrawnVoice[],
  room: { widthPx: number; heightPx: number; extent?: ExtentMm },
): RankLayout {
  const { slots, widthMm } = slotsOf(voices);
  const own = extentOf(voices);
  const extent = room.extent ?? own;
  const pxPerMm =
    extent.widthMm > 0 && extent.heightMm > 0
      ? Math.min(room.widthPx / extent.widthMm, room.heightPx / extent.heightMm)
      : 0;
  const heightPx = own.heightMm * pxPerMm;
  return {
    pxPerMm,
    widthPx: widthMm * pxPerMm,
    heightPx,
    voices: slots.map(({ voice, xMm, slotMm }) => {
      const width = Math.max(1.5, voice.widthMm * pxPerMm);
      const height = voice.lengthMm * pxPerMm;
      const centre = (xMm + voice.widthMm / 2) * pxPerMm;
      const slotWidth = slotMm * pxPerMm;
      return {
        voice,
        x: centre - width / 2,
        y: heightPx - height,
        width,
        height,
        slotX: centre - slotWidth / 2,
        slotWidth,
      };
    }),
  };
}

/** `1 : 2` as drawn on a screen of 96 px to the inch (CSS Values 4, absolute lengths), rounded to a plain ratio. */
export function scaleText(pxPerMm: number): string {
  const perMm = pxPerMm / (96 / 25.4);
  if (!(perMm > 0)) return '';
  const ratio = perMm >= 1 ? perMm : 1 / perMm;
  const plain = ratio < 10 ? Math.round(ratio * 2) / 2 : Math.round(ratio);
  return perMm >= 1 ? `${plain} : 1` : `1 : ${plain}`;
}
