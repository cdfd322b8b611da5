/** The list of kits when it is empty, or cut down to what fits a printer: apart, since few see it. */
export const noKitsTexts = {
  fitsOn: (bed: string) => `Only what fits ${bed} mm`,
  fitsAll: 'Show all kits',
  fitsNone: (bed: string) => `No kit fits ${bed} mm`,
  fitsNoneDetail: 'Each has at least one part that is too big, however it is turned.',
  empty: 'No kits on sale yet',
  emptyDetail: 'What the workshop releases will stand here, drawn to scale, ready to be heard.',
  emptyStaff: 'Draft the first kit',
  emptyAgain: 'Look again',
  beyond: 'No kits on this page',
  beyondDetail: 'The list ends before it.',
  toFirst: 'To the first page',
};
