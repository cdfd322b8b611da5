export const homeTexts = {
  motto: 'Instruments you print.',
  lead: 'Each kit is voiced by calculation, measured part by part and drawn from its own files.',
  press: (noun: string) => `Press a ${noun} to hear it.`,
  seeNewest: (name: string) => `See ${name}, the new kit`,
  heading: (count: number) =>
    `${numberWords[count] ?? count} ${count === 1 ? 'kit, drawn to scale' : 'kits, drawn to one scale'}`,
  sortBy: 'Sort by',
  sorts: { newest: 'newest', name: 'name', price: 'price', size: 'size' },
  fits: 'Only what fits my printer',
  longest: 'longest part',
  parts: (count: number) => (count === 1 ? 'part' : 'parts'),
  plates: (count: number) => (count === 1 ? 'plate' : 'plates'),
  filament: 'filament',
  drawn: (kit: string, voices: string) => `${kit}: ${voices}, drawn to scale`,
  left: (count: string) => `${count}\u00a0left`,
  failed: 'The kits cannot be shown',
};

const numberWords = [
  'No',
  'One',
  'Two',
  'Three',
  'Four',
  'Five',
  'Six',
  'Seven',
  'Eight',
  'Nine',
  'Ten',
  'Eleven',
  'Twelve',
];
