import type { Recording } from './read-recording.js';

/** Files are decoded whole, at sixteen times their size. */
export const mostRecordingBytes = 40_000_000;
const mostSeconds = 60;
const sampleRate = 48_000;

/** A sound file as samples of one channel, its first minute. Throws where the browser cannot decode it. */
export async function decodeRecording(file: Blob): Promise<Recording> {
  const decoder = new OfflineAudioContext(1, 1, sampleRate);
  const sound = await decoder.decodeAudioData(await file.arrayBuffer());
  const samples = new Float32Array(Math.min(sound.length, mostSeconds * sampleRate));
  for (let channel = 0; channel < sound.numberOfChannels; channel += 1)
    sound
      .getChannelData(channel)
      .subarray(0, samples.length)
      .forEach((one, at) => (samples[at]! += one / sound.numberOfChannels));
  return { samples, sampleRate: sound.sampleRate };
}
