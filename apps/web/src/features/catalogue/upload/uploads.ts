import { useSyncExternalStore } from 'react';
import { call } from '../../../lib/api-client.js';
import { hashFile } from './hash-file.js';
import { sendFile } from './send-file.js';
import { progressOf, type UploadItem } from './upload-item.js';
import { UploadQueue } from './upload-queue.js';

/** Uploads live beside the pages: going to another page of the workshop does not break them off. */
const queues = new Map<string, UploadQueue>();
const listeners = new Set<() => void>();

const isAnyBusy = () => [...queues.values()].some((queue) => progressOf(queue.items).isBusy);
const askBeforeLeaving = (event: BeforeUnloadEvent) => event.preventDefault();
let isAsking = false;

function onChange(): void {
  const isBusy = isAnyBusy();
  if (isBusy !== isAsking) {
    isAsking = isBusy;
    if (isBusy) window.addEventListener('beforeunload', askBeforeLeaving);
    else window.removeEventListener('beforeunload', askBeforeLeaving);
  }
  listeners.forEach((listener) => listener());
}

function queueOf(revisionId: string): UploadQueue {
  const known = queues.get(revisionId);
  if (known) return known;
  const queue = new UploadQueue(
    {
      hash: hashFile,
      offer: (files) =>
        call('POST /workshop/revisions/:revisionId/offers', { params: { revisionId }, body: { files } }),
      send: (file, sha256, onProgress) => sendFile(revisionId, file, sha256, onProgress),
    },
    onChange,
  );
  queues.set(revisionId, queue);
  return queue;
}

const subscribe = (listener: () => void) => {
  listeners.add(listener);
  return () => listeners.delete(listener);
};

export interface Uploads {
  items: readonly UploadItem[];
  queue: UploadQueue;
}

/** The files on their way into one revision. */
export function useUploads(revisionId: string): Uploads {
  const queue = queueOf(revisionId);
  return { queue, items: useSyncExternalStore(subscribe, () => queue.items) };
}
