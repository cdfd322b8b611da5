import { placePictures } from './placed-pictures.js';

describe('pictures in a text', () => {
  it('get the address they stand at, wherever they are in it', () => {
    const tree = {
      type: 'root',
      children: [{ type: 'paragraph', children: [{ type: 'image', url: 'picture:a1' }] }],
    };
    placePictures(tree, (id) => `/api/journal/pictures/${id}`);
    expect(tree.children[0]?.children[0]?.url).toBe('/api/journal/pictures/a1');
  });
  it('that stand elsewhere keep their address', () => {
    const image = { type: 'image', url: 'https://example.org/a.png' };
    placePictures(image, () => '/nowhere');
    expect(image.url).toBe('https://example.org/a.png');
  });
});
