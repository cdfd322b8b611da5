/** Places on the page of a kit on the shelf. */
export const sectionIds = {
  build: 'build',
  changeNotes: 'change-notes',
  licence: 'licence',
  cautions: 'cautions',
  downloads: 'downloads',
} as const;
