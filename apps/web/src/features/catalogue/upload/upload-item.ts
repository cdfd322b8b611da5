/** How far one file of an upload is. `refused` needs another file; `broken` may be tried again. */
export type UploadState =
  | { step: 'waiting' }
  | { step: 'hashing'; done: number }
  | { step: 'hashed' }
  | { step: 'stored' }
  | { step: 'queued' }
  | { step: 'sending'; done: number }
  | { step: 'sent' }
  | { step: 'refused'; sentence: string }
  | { step: 'broken'; sentence: string };

export interface UploadItem {
  readonly key: string;
  readonly file: File;
  readonly sha256: string | null;
  readonly state: UploadState;
}

export const isArrived = ({ state }: UploadItem): boolean => state.step === 'stored' || state.step === 'sent';
export const isFailed = ({ state }: UploadItem): boolean =>
  state.step === 'refused' || state.step === 'broken';
export const isUnderWay = (item: UploadItem): boolean => !isArrived(item) && !isFailed(item);

export interface UploadProgress {
  files: number;
  arrived: number;
  failed: number;
  /** Whether files are still read and hashed, before anything is sent. */
  isReading: boolean;
  read: number;
  isBusy: boolean;
  /** 0..1, by bytes of what was not refused. */
  done: number;
}

const bytesDone = ({ file, state }: UploadItem): number => {
  if (state.step === 'sending') return file.size * state.done;
  return state.step === 'stored' || state.step === 'sent' ? file.size : 0;
};

/** How far an upload is as a whole. A refused file weighs nothing: it will never arrive. */
export function progressOf(items: readonly UploadItem[]): UploadProgress {
  const count = (holds: (item: UploadItem) => boolean) => items.filter(holds).length;
  const wanted = items.filter((item) => item.state.step !== 'refused');
  const bytes = wanted.reduce((sum, item) => sum + item.file.size, 0);
  const unread = count(({ state }) => state.step === 'waiting' || state.step === 'hashing');
  const arrived = count(isArrived);
  return {
    files: items.length,
    arrived,
    failed: count(isFailed),
    isReading: unread > 0,
    read: items.length - unread,
    isBusy: items.some(isUnderWay),
    done:
      bytes > 0
        ? wanted.reduce((sum, item) => sum + bytesDone(item), 0) / bytes
        : arrived === wanted.length
          ? 1
          : 0,
  };
}
