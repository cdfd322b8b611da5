export type MicrophoneFault = 'refused' | 'missing' | 'insecure' | 'failed' | 'lost';

export interface OpenMicrophone {
  sampleRate: number;
  /** The newest samples, as many as asked for (a power of two). */
  read: (size: number) => Float32Array<ArrayBuffer>;
  close: () => void;
}

export class NoMicrophone extends Error {
  constructor(readonly fault: MicrophoneFault) {
    super(`no microphone: ${fault}`);
  }
}

const faults: Readonly<Record<string, MicrophoneFault>> = {
  NotAllowedError: 'refused',
  SecurityError: 'refused',
  NotFoundError: 'missing',
  OverconstrainedError: 'missing',
};

/** What helps a conversation bends a tone. */
const plain = { echoCancellation: false, noiseSuppression: false, autoGainControl: false, channelCount: 1 };

/**
 * Opens the microphone for this page alone. Must be called while a press is being handled.
 * @throws NoMicrophone
 */
export async function openMicrophone(onLost: () => void): Promise<OpenMicrophone> {
  // Browsers hide the whole interface from pages that are not encrypted.
  if (!('mediaDevices' in navigator)) throw new NoMicrophone('insecure');
  const stream = await navigator.mediaDevices.getUserMedia({ audio: plain }).catch((thrown: unknown) => {
    throw new NoMicrophone(faults[(thrown as DOMException).name] ?? 'failed');
  });
  const context = new AudioContext();
  const analyser = context.createAnalyser();
  context.createMediaStreamSource(stream).connect(analyser);
  if (context.state !== 'running') void context.resume().catch(() => undefined);
  stream.getAudioTracks()[0]?.addEventListener('ended', onLost);
  return {
    sampleRate: context.sampleRate,
    read: (size) => {
      if (analyser.fftSize !== size) analyser.fftSize = size;
      const frame = new Float32Array(size);
      analyser.getFloatTimeDomainData(frame);
      return frame;
    },
    close: () => {
      for (const track of stream.getTracks()) track.stop();
      void context.close().catch(() => undefined);
    },
  };
}
