import type { RankVoice } from '@windchest/contracts';
import { isSustained, noteToHz, partialsOf, predict, type Room, VoicingError } from '@windchest/voicing';

export interface SoundingVoice {
  /** Lets it end, softly. */
  stop: () => void;
}

/** Loudness of one voice: a laptop at full volume should not startle. */
const loudness = 0.22;
/** Above this share of the sample rate a partial would fold back as another tone. */
const highestOfRate = 0.45;
const attackS = { blown: 0.035, struck: 0.004 } as const;
const fadeS = 0.06;
/** However short the press, a blown voice is heard; however long, it ends. */
const leastS = 0.35;
const mostS = 6;
/** A struck voice's fundamental falls to a third in this time, its partials the faster the higher they are. */
const ringS = 0.5;

function pitchHz(voice: RankVoice['voice'], room: Room): number {
  try {
    return predict(voice, room).hz;
  } catch (thrown) {
    if (!(thrown instanceof VoicingError)) throw thrown;
    return noteToHz(voice.note, room);
  }
}

/** Sounds one voice at its predicted pitch, with the partials of its kind: sines with a soft beginning and end. */
export function soundVoice(context: AudioContext, voice: RankVoice['voice'], room: Room): SoundingVoice {
  const hz = pitchHz(voice, room);
  const isBlown = isSustained(voice.kind);
  const startS = context.currentTime + 0.005;
  const heard = partialsOf(voice.kind).filter(({ ratio }) => ratio * hz < context.sampleRate * highestOfRate);
  const sum = heard.reduce((total, { amplitude }) => total + amplitude, 0);
  const out = context.createGain();
  out.gain.setValueAtTime(0, startS);
  out.gain.linearRampToValueAtTime(
    loudness / Math.max(1, sum),
    startS + (isBlown ? attackS.blown : attackS.struck),
  );
  out.connect(context.destination);

  const longestS = isBlown ? mostS : ringS * 6;
  const tones = heard.map(({ ratio, amplitude }) => {
    const tone = context.createOscillator();
    const strength = context.createGain();
    tone.frequency.value = ratio * hz;
    strength.gain.setValueAtTime(amplitude, startS);
    if (!isBlown) strength.gain.setTargetAtTime(0, startS, ringS / Math.sqrt(ratio));
    tone.connect(strength).connect(out);
    tone.start(startS);
    tone.stop(startS + longestS);
    return tone;
  });
  if (isBlown) out.gain.setTargetAtTime(0, startS + longestS - 5 * fadeS, fadeS);
  // Whichever tone ends last: they all end together.
  tones[0]?.addEventListener('ended', () => out.disconnect());

  return {
    stop: () => {
      const endS = Math.max(context.currentTime, isBlown ? startS + leastS : startS);
      const isEnded = endS > startS + longestS - 5 * fadeS;
      // A struck voice rings on by itself.
      if (!isBlown || isEnded) return;
      out.gain.cancelScheduledValues(endS);
      out.gain.setTargetAtTime(0, endS, fadeS);
      tones.forEach((tone) => tone.stop(endS + 8 * fadeS));
    },
  };
}
