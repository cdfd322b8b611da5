import { deviceWords } from './device-words.js';

// Forms of the header as browsers send them, from memory.
describe('what a browser calls itself, in plain words', () => {
  it.each([
    ['Mozilla/5.0 (X11; Linux x86_64; rv:146.0) Gecko/20100101 Firefox/146.0', 'Firefox on Linux'],
    [
      'Mozilla/5.0 (Windows NT 10.0; Win64; x64) AppleWebKit/537.36 (KHTML, like Gecko) Chrome/143.0.0.0 Safari/537.36 Edg/143.0.0.0',
      'Edge on Windows',
    ],
    [
      'Mozilla/5.0 (Linux; Android 10; K) AppleWebKit/537.36 (KHTML, like Gecko) Chrome/143.0.0.0 Mobile Safari/537.36',
      'Chrome on Android',
    ],
    [
      'Mozilla/5.0 (iPhone; CPU iPhone OS 18_7 like Mac OS X) AppleWebKit/605.1.15 (KHTML, like Gecko) Version/26.1 Mobile/15E148 Safari/604.1',
      'Safari on iPhone',
    ],
    [
      'Mozilla/5.0 (Macintosh; Intel Mac OS X 10_15_7) AppleWebKit/605.1.15 (KHTML, like Gecko) Version/26.1 Safari/605.1.15',
      'Safari on macOS',
    ],
  ])('%s', (userAgent, words) => expect(deviceWords(userAgent)).toBe(words));

  it('is honest where nothing is known', () => {
    expect(deviceWords('')).toBe('A browser that does not say its name');
    expect(deviceWords('curl/8.5.0')).toBe('A browser that does not say its name');
    expect(deviceWords('Thing (Linux)')).toBe('A browser on Linux');
  });
});
