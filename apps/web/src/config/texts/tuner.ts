import type { VoiceKind } from '@windchest/voicing';

/** What takes a voice up to its note, and down; `mm` is a length with its unit, `percent` a change of tension. */
interface KindWords {
  /** How to make it sound for the tuner. */
  sound: string;
  trim: (mm: string, percent: string) => string;
  lengthen: (mm: string, percent: string) => string;
  /** What helps to hold the note where an overtone sounded instead. */
  overtone: string;
}

const pipe = {
  sound: 'Blow it softly and hold the tone.',
  lengthen: (mm: string) => `Reprint it ${mm} longer.`,
  overtone: 'Blow softer.',
};

export const kindWords: Record<VoiceKind, KindWords> = {
  'stopped-pipe': { ...pipe, trim: (mm) => `Trim ${mm} off the open end.` },
  'open-pipe': { ...pipe, trim: (mm) => `Trim ${mm} off the far end, away from the mouth.` },
  'free-bar': {
    sound: 'Rest it on its nodes and strike it a few times in the middle.',
    trim: (mm) => `Take ${mm} off its length, half at each end.`,
    lengthen: (mm) => `Reprint it ${mm} longer, or thin the middle of its underside, a little at a time.`,
    overtone: 'Strike it in the middle, with something soft.',
  },
  tine: {
    sound: 'Clamp it as it will be played and pluck it a few times.',
    trim: (mm) => `Take ${mm} off the free end.`,
    lengthen: (mm) => `Draw it ${mm} farther out of its clamp, or reprint it so much longer.`,
    overtone: 'Pluck it nearer to its free end.',
  },
  string: {
    sound: 'Pluck it a few times and let it ring.',
    trim: (mm, percent) => `Tighten it by ${percent} of its tension, or shorten what sounds by ${mm}.`,
    lengthen: (mm, percent) => `Slacken it by ${percent} of its tension, or lengthen what sounds by ${mm}.`,
    overtone: 'Pluck it in the middle, and let nothing touch it.',
  },
  vessel: {
    sound: 'Blow it softly and hold the tone.',
    trim: (mm) => `File its widest hole ${mm} wider.`,
    lengthen: (mm) => `Reprint it with its widest hole ${mm} narrower.`,
    overtone: 'Blow softer.',
  },
};

export const tunerTexts = {
  title: (kit: string) => `Tune ${kit}`,
  lead: (noun: string) =>
    `Choose a ${noun}, sound it, and read what to do. The sound stays in this browser: nothing is sent, nothing is kept.`,
  toKit: (kit: string) => `Back to ${kit}`,
  noVoices: 'Nothing to tune',
  noVoicesDetail: 'No part of this kit has a voice.',

  voice: 'Voice',
  voiceOption: (note: string, code: string) => `${note}, ${code}`,
  lower: 'Lower',
  lowerSpoken: 'Lower: the next voice down',
  higher: 'Higher',
  higherSpoken: 'Higher: the next voice up',
  rank: (noun: string) => `Press a ${noun} to choose it`,

  aside: 'Recording and room',
  listen: 'Listen',
  asking: 'Asking for the microphone …',
  stop: 'Stop listening',
  recording: 'Read a recording',
  recordingHint:
    'Instead of the microphone: WAV, MP3, OGG or FLAC of this one voice. Its first minute is read, here.',
  reading: 'Reading …',
  read: (file: string) => `Read from ${file}.`,
  unreadableTitle: 'The recording cannot be read',
  unreadable: (file: string) => `“${file}” is no sound this browser knows. Save it as WAV, MP3, OGG or FLAC.`,
  tooLarge: (file: string, most: string) => `“${file}” is larger than ${most}. Cut it to a few seconds.`,

  microphone: {
    refused: {
      title: 'The microphone was refused',
      detail:
        'Allow it for this site beside the address, in the browser’s settings of this page, then press Listen again. A recording works without.',
    },
    missing: {
      title: 'No microphone was found',
      detail:
        'Plug one in, or turn it on in the system’s sound settings, then press Listen again. A recording works without.',
    },
    insecure: {
      title: 'The browser gives no microphone here',
      detail: 'It does so only on encrypted pages (https). A recording works all the same.',
    },
    failed: {
      title: 'The microphone did not start',
      detail: 'Another program may hold it. Close that, then press Listen again. A recording works without.',
    },
    lost: {
      title: 'The microphone went away',
      detail: 'Plug it in again, then press Listen.',
    },
  },

  room: 'The room it sounds in now',
  tuneFor: 'Tune it for',
  forKit: (degrees: string) => `${degrees}, as the kit is voiced`,
  forRoom: 'this room as it is',

  waiting: 'Not listening yet',
  waitingDetail: 'Press Listen, or choose a recording.',
  now: {
    waiting: 'Listening',
    pitch: 'Hearing a tone; hold it a moment.',
    quiet: 'Too quiet. Come nearer to the microphone, or sound it stronger.',
    noise: 'No clear tone. Sound one voice alone, and keep wind, voices and fans away.',
  },
  recordingHears: {
    quiet: 'The recording is silent, or too quiet to read.',
    noise:
      'No clear tone in this recording, or too little of it. Record this one voice alone for a second or two.',
  },

  flat: (cents: string) => `${cents} flat`,
  sharp: (cents: string) => `${cents} sharp`,
  inTune: 'In tune',
  cents: (count: string) => `${count} ${count === '1' ? 'cent' : 'cents'}`,
  leave: 'Leave it as it is.',
  leaveUnsteady: 'Too near to cut on so unsteady a tone. Leave it, or sound it steadier.',
  unsteady: 'The tone wanders. Hold it steadier before you cut anything.',
  listenAgain: 'Cut less than told, then listen again: nothing grows back.',
  withinDeclared: (cents: string) => `Within the ±${cents} the kit is declared for.`,
  heard: (hz: string, spread: string) => `Heard ${hz}, steady within ±${spread}.`,
  lastHeard: 'Last heard',
  hair: 'a hair, less than 0.1 mm,',
  percent: (value: string) => `${value} %`,

  overtone: (name: string, note: string) => `That is ${name} of ${note}, not its own tone.`,
  octave: 'the octave',
  twelfth: 'the twelfth',
  doubleOctave: 'the double octave',
  overtones: ['first', 'second', 'third', 'fourth', 'fifth', 'sixth', 'seventh'].map(
    (ordinal) => `the ${ordinal} overtone`,
  ),
  someOvertone: 'an overtone',
  below: (note: string) => `That is an octave below ${note}.`,
  belowDetail: 'Another voice sounds, or the wrong one is chosen.',
  another: (heard: string, note: string) => `That is ${heard}, not ${note}.`,
  tooFar: (note: string) => `That is no note near ${note}.`,
  anotherDetail: 'Choose the voice you sound, or sound the one that is chosen.',
  orVoice: (note: string, code: string) => `It may be ${note}, ${code}.`,
  nearer: (note: string, code: string, cents: string) => `It is nearer to ${note}, ${code}: ${cents}.`,
  choose: (note: string) => `Choose ${note}`,
  beyond: 'No cut mends this',

  blockVoice: 'Voice',
  blockNote: 'Note',
  blockTarget: 'Should sound',
  blockHeard: 'Heard',
  blockNothing: '–',
  blockDeclared: 'Declared',
  blockA4: 'A4',
  hertz: (value: string) => `${value} Hz`,
  within: (cents: string) => `±${cents}`,
  revision: (label: string) => `The voices of ${label}.`,

  strip: {
    flat: 'flat',
    sharp: 'sharp',
    heard: 'heard',
    foreseen: 'by calculation',
    declared: 'as the kit is declared',
  },
  foreseen: (off: string, unsure: string) =>
    `By calculation this print sounds ${off}, give or take ${unsure}. That is a prediction, no promise: what is heard counts.`,
  foreseenOn: 'on its note',
  beyondFormulas: 'Its sizes lie outside what can be calculated.',
  doubts: 'What makes the calculation unsure',
  doubt: (from: string, cents: string) => `${from}: ±${cents}`,

  soFar: 'Heard so far',
  soFarDetail: 'Of this visit; it goes when the page is closed.',
  soFarCaption: 'Voices heard, with what to do',
  columns: { note: 'Note', code: 'Voice', off: 'From its note', todo: 'What to do' },
  offBy: (off: string, spread: string) => `${off}, ±${spread}`,

  cautions: 'Before you cut or blow',
  cautionList: [
    'Ears: small pipes and whistles are loud close by, and so are headphones. Keep the microphone near and your ears away.',
    'Knives, files and saws: cut away from yourself, hold the part in a vice or on a mat, and wear eye protection.',
    'Printed dust is fine: file wet or with a mask, and clear it away. It does not belong in a mouthpiece.',
    'Strings and bands under tension: eye protection on, and slacken them before you cut.',
  ],
};
