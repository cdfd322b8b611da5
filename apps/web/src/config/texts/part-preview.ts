export const partPreviewTexts = {
  open: 'Turn it',
  /** Over a column of such buttons. */
  column: 'In three dimensions',
  openOf: (code: string) => `Turn it in three dimensions: ${code}`,
  press: 'Press one to turn it in three dimensions.',
  title: (code: string, name: string) => `${code} ${name}`,
  size: (x: string, y: string, z: string) =>
    `${x} mm wide, ${y} mm deep, ${z} mm tall, as it goes on the bed.`,
  coarse: 'A coarse likeness to look at, not the file: edges are rounded to more than half a millimetre.',
  loading: (size: string) => `Fetching the likeness, ${size}, and what draws it …`,
  failed: 'The part cannot be shown in three dimensions',
  unreadable: 'The likeness could not be read.',
  view: (part: string) => `${part}, to turn about`,
  how: 'Drag it, or use the arrow keys; + and − come nearer and go back, Home brings the first view.',
  controls: 'Turn the part',
  steps: {
    left: 'Turn left',
    right: 'Turn right',
    up: 'Tip up',
    down: 'Tip down',
    nearer: 'Nearer',
    farther: 'Farther',
    reset: 'First view',
  },
  looking: (around: string, above: string) => `Seen from ${around}° around, ${above}° above`,
  noWebGl:
    'This browser does not draw in three dimensions (WebGL 2), or is told not to. The drawing shows the side that tells most.',
  lost: 'The browser took the drawing surface away. Close this and open it again.',
  close: 'Close',
};
