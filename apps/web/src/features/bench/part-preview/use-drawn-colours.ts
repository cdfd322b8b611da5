import { type RefObject, useEffect, useState } from 'react';

export interface DrawnColours {
  kit: string;
  deep: string;
  hairline: string;
}

const variables: Record<keyof DrawnColours, string> = {
  kit: '--wc-colors-kit',
  deep: '--wc-colors-kit-deep',
  hairline: '--wc-colors-edge',
};

/** A colour as CSS has it (OKLCH), in the form that WebGL programs know. */
function toRgb(colour: string): string {
  const pen = Object.assign(document.createElement('canvas'), { width: 1, height: 1 }).getContext('2d');
  if (!pen) return '#888888';
  pen.fillStyle = colour;
  pen.fillRect(0, 0, 1, 1);
  const [red, green, blue] = pen.getImageData(0, 0, 1, 1).data;
  return `rgb(${red}, ${green}, ${blue})`;
}

function coloursAt(element: Element): DrawnColours {
  const style = getComputedStyle(element);
  const read = (name: keyof DrawnColours) => toRgb(style.getPropertyValue(variables[name]).trim());
  return { kit: read('kit'), deep: read('deep'), hairline: read('hairline') };
}

/** The kit's colours where an element stands, also after the page went from light to dark. */
export function useDrawnColours(ref: RefObject<Element | null>): DrawnColours | undefined {
  const [colours, setColours] = useState<DrawnColours>();
  useEffect(() => {
    const read = () => ref.current && setColours(coloursAt(ref.current));
    read();
    const watch = new MutationObserver(read);
    watch.observe(document.documentElement, { attributeFilter: ['class'] });
    return () => watch.disconnect();
  }, [ref]);
  return colours;
}
