import { ApiFault, unreachable } from '../../../lib/api-fault.js';
import { progressOf } from './upload-item.js';
import { type Offer, type UploadDoors, UploadQueue } from './upload-queue.js';

const file = (name: string, size = 10) => new File([new Uint8Array(size)], name);
const limits = { fileBytes: 1000 };

interface Stand {
  queue: UploadQueue;
  sent: string[];
  offers: Offer[][];
  mostAtOnce: () => number;
}

function stand(doors: Partial<UploadDoors> = {}): Stand {
  const sent: string[] = [];
  const offers: Offer[][] = [];
  let running = 0;
  let most = 0;
  const queue = new UploadQueue(
    {
      hash: async (one) => `hash of ${one.name}`,
      offer: async (files) => {
        offers.push(files);
        return files.map(({ fileName, sha256 }) => ({ fileName, sha256, answer: 'send', detail: '' }));
      },
      send: async (one) => {
        running += 1;
        most = Math.max(most, running);
        await new Promise((resolve) => setImmediate(resolve));
        running -= 1;
        sent.push(one.name);
      },
      ...doors,
    },
    () => {},
  );
  return { queue, sent, offers, mostAtOnce: () => most };
}

async function untilQuiet(queue: UploadQueue): Promise<void> {
  while (progressOf(queue.items).isBusy) await new Promise((resolve) => setImmediate(resolve));
}
const steps = (queue: UploadQueue) => queue.items.map((item) => item.state.step);

describe('UploadQueue', () => {
  it('offers all files at once and sends them three at a time', async () => {
    const { queue, sent, offers, mostAtOnce } = stand();
    queue.add(
      Array.from({ length: 8 }, (_, at) => file(`P-${at}.stl`)),
      limits,
    );
    await untilQuiet(queue);
    expect(offers).toHaveLength(1);
    expect(offers[0]).toHaveLength(8);
    expect(sent).toHaveLength(8);
    expect(mostAtOnce()).toBe(3);
    expect(progressOf(queue.items)).toMatchObject({ arrived: 8, failed: 0, done: 1 });
  });

  it('does not send what is stored already', async () => {
    const { queue, sent } = stand({
      offer: async (files) =>
        files.map(({ fileName, sha256 }) => ({
          fileName,
          sha256,
          answer: fileName === 'old.stl' ? 'attached' : 'send',
          detail: '',
        })),
    });
    queue.add([file('old.stl'), file('new.stl')], limits);
    await untilQuiet(queue);
    expect(sent).toEqual(['new.stl']);
    expect(steps(queue)).toEqual(['stored', 'sent']);
  });

  it('goes on with the rest when one file is refused and one breaks off', async () => {
    const { queue } = stand({
      send: async (one) => {
        if (one.name === 'bad.stl')
          throw new ApiFault({ code: 'file-refused', status: 422, detail: 'bad.stl is cut off.' });
        if (one.name === 'cut.stl') throw unreachable();
      },
    });
    queue.add([file('bad.stl'), file('cut.stl'), file('good.stl')], limits);
    await untilQuiet(queue);
    expect(steps(queue)).toEqual(['refused', 'broken', 'sent']);
    expect(queue.items[0]?.state).toMatchObject({ sentence: 'bad.stl is cut off.' });
  });

  it('offers a broken file again before it sends it again, without hashing it twice', async () => {
    let hashed = 0;
    let tries = 0;
    const { queue, offers } = stand({
      hash: async () => `hash ${++hashed}`,
      send: async () => {
        if (++tries === 1) throw unreachable();
      },
    });
    queue.add([file('a.stl')], limits);
    await untilQuiet(queue);
    queue.retryAll();
    await untilQuiet(queue);
    expect(steps(queue)).toEqual(['sent']);
    expect(offers).toHaveLength(2);
    expect(hashed).toBe(1);
  });

  it('does not try a refused file again', async () => {
    const { queue, offers } = stand({
      send: async () => {
        throw new ApiFault({ code: 'file-refused', status: 422, detail: 'No.' });
      },
    });
    queue.add([file('a.stl')], limits);
    await untilQuiet(queue);
    queue.retryAll();
    await untilQuiet(queue);
    expect(offers).toHaveLength(1);
  });

  it('refuses a file beyond the limit before reading it', async () => {
    const { queue, offers } = stand();
    queue.add([file('huge.stl', 1001), file('small.stl')], limits);
    await untilQuiet(queue);
    expect(steps(queue)).toEqual(['refused', 'sent']);
    expect(offers[0]?.map((one) => one.fileName)).toEqual(['small.stl']);
  });

  it('keeps every file for another try when the offer does not get through', async () => {
    const { queue } = stand({
      offer: async () => {
        throw unreachable();
      },
    });
    queue.add([file('a.stl'), file('b.stl')], limits);
    await untilQuiet(queue);
    expect(steps(queue)).toEqual(['broken', 'broken']);
  });

  it('puts a file dropped again in the place of its failed forerunner', async () => {
    let isBroken = true;
    const { queue } = stand({
      send: async () => {
        if (isBroken) throw unreachable();
      },
    });
    queue.add([file('a.stl')], limits);
    await untilQuiet(queue);
    isBroken = false;
    queue.add([file('a.stl')], limits);
    await untilQuiet(queue);
    expect(steps(queue)).toEqual(['sent']);
  });
});

describe('a second upload', () => {
  it('starts a list of its own, with what failed in the first', async () => {
    const { queue } = stand({
      send: async (one) => {
        if (one.name === 'bad.stl') throw unreachable();
      },
    });
    queue.add([file('good.stl'), file('bad.stl')], limits);
    await untilQuiet(queue);
    queue.add([file('next.stl')], limits);
    await untilQuiet(queue);
    expect(queue.items.map((item) => item.file.name)).toEqual(['bad.stl', 'next.stl']);
  });
});

describe('progressOf', () => {
  it('counts by bytes and leaves refused files out of the measure', async () => {
    const { queue } = stand({
      send: async (one, _, onProgress) => {
        onProgress(0.5);
        if (one.name === 'half.stl') await new Promise(() => {});
      },
    });
    queue.add([file('refused.stl', 2000), file('whole.stl', 300), file('half.stl', 100)], limits);
    while (queue.items.filter((item) => item.state.step === 'sent').length < 1)
      await new Promise((resolve) => setImmediate(resolve));
    expect(progressOf(queue.items)).toMatchObject({ files: 3, arrived: 1, failed: 1, isBusy: true });
    expect(progressOf(queue.items).done).toBeCloseTo(350 / 400, 10);
  });
});
