export const schemaTexts = {
  missing: 'Fill this in.',
  number: 'Write a number.',
  whole: 'Write a whole number.',
  atLeast: (least: string) => `Write ${least} or more.`,
  moreThan: (least: string) => `Write more than ${least}.`,
  atMost: (most: string) => `Write ${most} or less.`,
  tooLong: (most: string) => `Use ${most} characters at most.`,
  wrongForm: 'This has not the right form. Check it and try again.',
};

export const savingTexts = {
  save: 'Save',
  saving: 'Saving …',
  saved: 'Saved',
  cancel: 'Leave it',
};
