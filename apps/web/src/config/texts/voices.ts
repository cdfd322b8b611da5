/** What a kind of voice is called, one of it and several. */
export const voiceNouns = {
  'stopped-pipe': { one: 'pipe', many: 'pipes' },
  'open-pipe': { one: 'pipe', many: 'pipes' },
  'free-bar': { one: 'bar', many: 'bars' },
  tine: { one: 'tine', many: 'tines' },
  string: { one: 'string', many: 'strings' },
  vessel: { one: 'vessel', many: 'vessels' },
} as const;

/** Of a rank with more than one kind in it. */
export const anyVoice = { one: 'voice', many: 'voices' } as const;
