import type { OutputOf } from '@windchest/contracts';
import { uploadTexts } from '../../../config/texts/workshop-upload.js';
import { ApiFault } from '../../../lib/api-fault.js';
import { bytes } from '../../../lib/format.js';
import { isFailed, isUnderWay, type UploadItem, type UploadState } from './upload-item.js';

type OfferAnswer = OutputOf<'POST /workshop/revisions/:revisionId/offers'>[number];
export interface Offer {
  fileName: string;
  sha256: string;
  bytes: number;
}

/** The ways out of the queue. `offer` and `send` throw ApiFault. */
export interface UploadDoors {
  hash: (file: File, onProgress: (done: number) => void) => Promise<string>;
  offer: (files: Offer[]) => Promise<OfferAnswer[]>;
  send: (file: File, sha256: string, onProgress: (done: number) => void) => Promise<void>;
}

/** The API takes no more in one offer. */
const offerLimit = 500;
const atOnce = 3;

/** The server read the file, or the request, and said no: sending the same again changes nothing. */
const isFinal = (fault: ApiFault): boolean =>
  ['file-refused', 'file-too-large', 'revision-too-large', 'revision-is-released', 'forbidden'].includes(
    fault.code,
  );

const failedAs = (thrown: unknown, fileName: string): UploadState => {
  if (!(thrown instanceof ApiFault)) throw thrown;
  if (thrown.code === 'unreachable') return { step: 'broken', sentence: uploadTexts.brokenOff(fileName) };
  return {
    step: isFinal(thrown) ? 'refused' : 'broken',
    sentence: thrown.detail || thrown.title,
  };
};

/**
 * Files on their way into a revision: hashed one after the other, offered together, sent three at a time. What
 * happens to one file never disturbs another.
 */
export class UploadQueue {
  private list: readonly UploadItem[] = [];
  private hashing: Promise<unknown> = Promise.resolve();
  private sendingNow = 0;
  private keysGiven = 0;

  constructor(
    private readonly doors: UploadDoors,
    private readonly onChange: () => void,
  ) {}

  /** A new array after every change. */
  get items(): readonly UploadItem[] {
    return this.list;
  }

  /** Adds files; one that is on its way already is left out, one that came to an end makes room for its successor. */
  add(files: readonly File[], limits: { fileBytes: number }): void {
    const fresh = files.filter(
      (file) =>
        !this.list.some(
          (item) => item.file.name === file.name && item.file.size === file.size && isUnderWay(item),
        ),
    );
    const names = new Set(fresh.map((file) => file.name));
    const added = fresh.map((file): UploadItem => ({
      key: `upload-${++this.keysGiven}`,
      file,
      sha256: null,
      state:
        file.size > limits.fileBytes
          ? {
              step: 'refused',
              sentence: uploadTexts.tooLarge(file.name, bytes(file.size), bytes(limits.fileBytes)),
            }
          : { step: 'waiting' },
    }));
    // A new upload begins where the last one came to its end; only what failed then still wants a look.
    const isNewUpload = !this.list.some(isUnderWay);
    const kept = this.list.filter(
      (item) => isUnderWay(item) || (!names.has(item.file.name) && (!isNewUpload || isFailed(item))),
    );
    this.list = [...kept, ...added];
    this.onChange();
    this.start(added.filter((item) => item.state.step === 'waiting').map((item) => item.key));
  }

  /** Tries broken ones again; they are offered again first, since the file may have arrived and only the answer got lost. */
  retry(keys: readonly string[]): void {
    const broken = this.list.filter((item) => keys.includes(item.key) && item.state.step === 'broken');
    broken.forEach((item) => this.set(item.key, { step: item.sha256 ? 'hashed' : 'waiting' }));
    this.start(broken.map((item) => item.key));
  }

  retryAll(): void {
    this.retry(this.list.map((item) => item.key));
  }

  /** Takes out what has come to an end. */
  clear(): void {
    this.list = this.list.filter(isUnderWay);
    this.onChange();
  }

  private start(keys: readonly string[]): void {
    if (keys.length === 0) return;
    this.hashing = this.hashing
      .then(() => this.hashAll(keys))
      .then(() => this.offerAll(keys))
      .then(() => this.sendNext());
  }

  private async hashAll(keys: readonly string[]): Promise<void> {
    for (const key of keys) {
      const item = this.find(key);
      if (!item || item.sha256) continue;
      this.set(key, { step: 'hashing', done: 0 });
      try {
        const sha256 = await this.doors.hash(item.file, (done) => this.set(key, { step: 'hashing', done }));
        this.set(key, { step: 'hashed' }, sha256);
      } catch {
        this.set(key, { step: 'broken', sentence: uploadTexts.unreadable(item.file.name) });
      }
    }
  }

  private async offerAll(keys: readonly string[]): Promise<void> {
    const ready = keys.flatMap((key) => {
      const item = this.find(key);
      return item?.sha256 && item.state.step === 'hashed' ? [{ ...item, sha256: item.sha256 }] : [];
    });
    for (let from = 0; from < ready.length; from += offerLimit) {
      const some = ready.slice(from, from + offerLimit);
      try {
        const answers = await this.doors.offer(
          some.map(({ file, sha256 }) => ({ fileName: file.name, sha256, bytes: file.size })),
        );
        some.forEach((item, at) => this.set(item.key, afterOffer(answers[at])));
      } catch (thrown) {
        some.forEach((item) => this.set(item.key, failedAs(thrown, item.file.name)));
      }
    }
  }

  private sendNext(): void {
    while (this.sendingNow < atOnce) {
      const next = this.list.find((item) => item.state.step === 'queued');
      if (!next) return;
      void this.sendOne(next);
    }
  }

  private async sendOne({ key, file, sha256 }: UploadItem): Promise<void> {
    this.sendingNow += 1;
    this.set(key, { step: 'sending', done: 0 });
    try {
      await this.doors.send(file, sha256 ?? '', (done) => this.set(key, { step: 'sending', done }));
      this.set(key, { step: 'sent' });
    } catch (thrown) {
      this.set(key, failedAs(thrown, file.name));
    } finally {
      this.sendingNow -= 1;
      this.sendNext();
    }
  }

  private find(key: string): UploadItem | undefined {
    return this.list.find((item) => item.key === key);
  }

  private set(key: string, state: UploadState, sha256?: string): void {
    this.list = this.list.map((item) =>
      item.key === key ? { ...item, state, sha256: sha256 ?? item.sha256 } : item,
    );
    this.onChange();
  }
}

const afterOffer = (answer: OfferAnswer | undefined): UploadState => {
  if (answer?.answer === 'attached') return { step: 'stored' };
  if (answer?.answer === 'refused') return { step: 'refused', sentence: answer.detail };
  return { step: 'queued' };
};
