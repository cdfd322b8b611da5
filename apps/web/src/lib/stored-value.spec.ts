import { storedValue } from './stored-value.js';

const fakeStorage = (kept: Record<string, string> = {}) => ({
  kept,
  getItem: (key: string) => kept[key] ?? null,
  setItem: (key: string, text: string) => void (kept[key] = text),
  removeItem: (key: string) => void delete kept[key],
});

const colourIn = (storage: ReturnType<typeof fakeStorage>, events = new EventTarget()) => ({
  events,
  stored: storedValue<string>({
    key: 'colour',
    read: (text) => text ?? 'none',
    write: (value) => (value === 'none' ? null : value),
    storage: () => storage,
    events: () => events,
  }),
});

/** What the browser tells other tabs when one of them writes. */
const written = (key: string | null) => Object.assign(new Event('storage'), { key });

describe('storedValue', () => {
  it('reads what was kept before and keeps what is set', () => {
    const storage = fakeStorage({ colour: 'teal' });
    const { stored } = colourIn(storage);
    expect(stored.get()).toBe('teal');
    stored.set('moss');
    expect(storage.kept).toEqual({ colour: 'moss' });
    expect(stored.get()).toBe('moss');
  });

  it('keeps nothing for a value that is written as nothing', () => {
    const storage = fakeStorage({ colour: 'teal' });
    colourIn(storage).stored.set('none');
    expect(storage.kept).toEqual({});
  });

  it('tells its listeners when another tab changed the value', () => {
    const storage = fakeStorage({ colour: 'teal' });
    const { stored, events } = colourIn(storage);
    const heard: string[] = [];
    const stop = stored.subscribe(() => heard.push(stored.get()));
    storage.kept['colour'] = 'rose';
    events.dispatchEvent(written('colour'));
    events.dispatchEvent(written('something-else'));
    stop();
    storage.kept['colour'] = 'blue';
    events.dispatchEvent(written('colour'));
    expect(heard).toEqual(['rose']);
  });

  it('hears that another tab cleared all', () => {
    const storage = fakeStorage({ colour: 'teal' });
    const { stored, events } = colourIn(storage);
    stored.subscribe(() => undefined);
    expect(stored.get()).toBe('teal');
    delete storage.kept['colour'];
    events.dispatchEvent(written(null));
    expect(stored.get()).toBe('none');
  });

  it('gives the same object until the value changes, as React asks of a store', () => {
    const stored = storedValue<string[]>({
      key: 'list',
      read: (text) => JSON.parse(text ?? '[]') as string[],
      write: JSON.stringify,
      storage: () => fakeStorage({ list: '["a"]' }),
      events: () => undefined,
    });
    expect(stored.get()).toBe(stored.get());
  });

  it('lives as long as the page where storage is refused', () => {
    const stored = storedValue<string>({
      key: 'colour',
      read: (text) => text ?? 'none',
      write: (value) => value,
      storage: () => {
        throw new Error('The operation is insecure.');
      },
      events: () => undefined,
    });
    expect(stored.get()).toBe('none');
    stored.set('teal');
    expect(stored.get()).toBe('teal');
  });
});
