import { createHash } from 'node:crypto';
import { readdir, readFile } from 'node:fs/promises';
import { request } from 'node:http';
import { join } from 'node:path';
import { keyOf, Storage } from '../../adapters/storage/storage.js';
import { CONFIG, type Config } from '../../config/config.js';
import { selectRows } from '../../database/rows.js';
import {
  BOUNDARY,
  multipart,
  boxStl,
  draftKit,
  readRevision,
  sendFile,
  startRevision,
  upload,
} from '../../testing/maker.js';
import { signInAs } from '../../testing/sign-in.js';
import { startTestApp, type Browser, type TestApp } from '../../testing/test-app.js';

const REFERENCE = new URL('../../../../../packages/meshes/fixtures/reference/', import.meta.url);
const reference = (name: string): Promise<Buffer> => readFile(new URL(name, REFERENCE));
const sha256 = (contents: Buffer | string): string => createHash('sha256').update(contents).digest('hex');

describe('uploads', () => {
  let shop: TestApp;
  let maker: Browser;
  beforeAll(async () => {
    shop = await startTestApp({ MAX_FILE_BYTES: '300000', MAX_REVISION_BYTES: '700000' });
    maker = await signInAs(shop, 'maker');
  });
  afterAll(() => shop.stop());
  const newDraft = async (): Promise<string> =>
    (await startRevision(maker, (await draftKit(maker, 'Sandpiper')).id)).id;
  const storedFile = (hash: string) => shop.app.get(Storage).head(keyOf('files', hash));

  it('stand in the storage under their hash and are measured', async () => {
    const revisionId = await newDraft();
    const stl = boxStl(10, 20, 30);
    const file = await upload(maker, revisionId, 'J-01 Locking tongue.stl', stl);
    expect(file).toMatchObject({ sha256: sha256(stl), bytes: stl.length, kind: 'stl', measuring: 'waiting' });
    expect(await storedFile(file.sha256)).toEqual({ bytes: stl.length });
    await shop.drain();
    const revision = await readRevision(maker, revisionId);
    expect(revision.parts).toMatchObject([{ code: 'J-01', name: 'Locking tongue', quantity: 1 }]);
    expect(revision.parts[0]!.file).toMatchObject({
      measuring: 'measured',
      fault: null,
      partId: revision.parts[0]!.id,
      measurement: { triangles: 12, sizeMm: { x: 10, y: 20, z: 30 }, volumeCm3: 6, isWatertight: true },
    });
    expect(revision.parts[0]!.drawings!.front).toMatchObject({ widthMm: 10, heightMm: 30 });
    expect(revision.totalBytes).toBe(stl.length);
    expect(revision.limits).toEqual({ fileBytes: 300_000, revisionBytes: 700_000 });
  });

  it('leave nothing half-written behind', async () => {
    const config = shop.app.get<Config>(CONFIG);
    expect(await readdir(join(config.FILES_DIR, 'incoming'))).toEqual([]);
  });

  it('are measured once for the same bytes, however often they are used', async () => {
    const stl = boxStl(11, 12, 13);
    await upload(maker, await newDraft(), 'A.stl', stl);
    await shop.drain();
    const second = await upload(maker, await newDraft(), 'B.stl', stl);
    expect(second.measuring).toBe('measured');
    const jobs = await selectRows(
      shop.database,
      `SELECT id FROM jobs WHERE name = 'catalogue.measure-file' AND payload LIKE :like`,
      { like: `%${sha256(stl)}%` },
    );
    expect(jobs).toHaveLength(1);
  });

  it('skip by offer what is stored already', async () => {
    const stl = boxStl(14, 15, 16);
    await upload(maker, await newDraft(), 'C-01 Lid.stl', stl);
    const revisionId = await newDraft();
    const unknown = 'ab'.repeat(32);
    const { body } = await maker
      .post(`/api/workshop/revisions/${revisionId}/offers`)
      .send({
        files: [
          { fileName: 'C-01 Lid.stl', sha256: sha256(stl), bytes: stl.length },
          { fileName: 'C-02 Box.stl', sha256: unknown, bytes: 100 },
          { fileName: '../../etc/passwd', sha256: unknown, bytes: 100 },
          { fileName: 'C-03 Huge.stl', sha256: unknown, bytes: 300_001 },
        ],
      })
      .expect(200);
    expect(body.map((one: { answer: string }) => one.answer)).toEqual([
      'attached',
      'send',
      'refused',
      'refused',
    ]);
    expect(body[2].detail).toMatch(/passwd.*climbs out of its folder/);
    expect(body[3].detail).toMatch(/larger than 293.0 KiB/);
    expect((await readRevision(maker, revisionId)).parts).toMatchObject([{ code: 'C-01', name: 'Lid' }]);
  });

  it('put a new file of the same name or the same code in the place of the old one', async () => {
    const revisionId = await newDraft();
    const first = await upload(maker, revisionId, 'K-01 Key.stl', boxStl(1, 2, 30));
    await maker
      .put(`/api/workshop/revisions/${revisionId}/parts/${first.partId}`)
      .send({
        code: 'K-07',
        name: 'Long key',
        quantity: 4,
        orientation: 'may-lie',
        printSpec: null,
        voice: null,
      })
      .expect(200);
    const second = await upload(maker, revisionId, 'k-01 key.STL', boxStl(1, 2, 31));
    expect(second).toMatchObject({ id: first.id, partId: first.partId, sha256: sha256(boxStl(1, 2, 31)) });
    const third = await upload(maker, revisionId, 'K-07 Longer key v2.stl', boxStl(1, 2, 32));
    expect(third).toMatchObject({ id: first.id, fileName: 'K-07 Longer key v2.stl' });
    expect((await readRevision(maker, revisionId)).parts).toMatchObject([
      { code: 'K-07', name: 'Long key', quantity: 4, file: { sha256: sha256(boxStl(1, 2, 32)) } },
    ]);
  });

  it('give a part without a code in its name the next free one', async () => {
    const revisionId = await newDraft();
    await upload(maker, revisionId, 'P-01_pipe.stl', boxStl(1, 1, 40));
    await upload(maker, revisionId, 'mouth piece.stl', boxStl(1, 1, 41));
    expect((await readRevision(maker, revisionId)).parts).toMatchObject([
      { code: 'P-01', name: 'Pipe' },
      { code: 'P-02', name: 'Mouth piece' },
    ]);
  });

  it('may come all at once, and every part gets a code of its own', async () => {
    const revisionId = await newDraft();
    const sizes = Array.from({ length: 12 }, (_, at) => at + 1);
    const files = await Promise.all(
      sizes.map((mm) => upload(maker, revisionId, `piece ${mm}.stl`, boxStl(3, 3, mm))),
    );
    expect(new Set(files.map((file) => file.partId)).size).toBe(12);
    const codes = (await readRevision(maker, revisionId)).parts.map((part) => part.code);
    expect(codes).toEqual(sizes.map((number) => `P-${String(number).padStart(2, '0')}`));
  });

  it('that break off leave nothing behind, and go on when sent again', async () => {
    const revisionId = await newDraft();
    const stl = boxStl(3, 4, 55);
    const body = multipart('X-01 Half.stl', stl);
    const { cookie } = await sessionOf(maker);
    const incoming = join(shop.app.get<Config>(CONFIG).FILES_DIR, 'incoming');
    const untilHalves = async (count: number): Promise<void> => {
      for (let wait = 0; wait < 200 && (await readdir(incoming)).length !== count; wait++)
        await new Promise((resolve) => setTimeout(resolve, 25));
      expect(await readdir(incoming)).toHaveLength(count);
    };
    const half = request(new URL(`/api/workshop/revisions/${revisionId}/files`, shop.url), {
      method: 'POST',
      headers: {
        'X-Windchest': '1',
        Cookie: cookie,
        'Content-Type': `multipart/form-data; boundary=${BOUNDARY}`,
        'Content-Length': body.length,
      },
    });
    half.on('error', () => undefined);
    half.write(body.subarray(0, body.length - 200));
    await untilHalves(1);
    half.destroy();
    await untilHalves(0);
    expect((await readRevision(maker, revisionId)).parts).toEqual([]);
    expect(await upload(maker, revisionId, 'X-01 Half.stl', stl)).toMatchObject({ sha256: sha256(stl) });
  });

  /** The maker's own cookie, to send a request by hand. */
  const sessionOf = async (browser: Browser): Promise<{ cookie: string }> => {
    const seen = browser.get('/api/session');
    await seen.expect(200);
    return { cookie: String((seen as unknown as { cookies: string }).cookies) };
  };

  it('keep a part’s code and settings when its file is taken out, and take the file with a dropped part', async () => {
    const revisionId = await newDraft();
    const file = await upload(maker, revisionId, 'D-01 Drone.stl', boxStl(2, 2, 50));
    await maker.delete(`/api/workshop/revisions/${revisionId}/files/${file.id}`).expect(204);
    expect((await readRevision(maker, revisionId)).parts).toMatchObject([{ code: 'D-01', file: null }]);
    const again = await upload(maker, revisionId, 'D-01 Drone.stl', boxStl(2, 2, 51));
    expect(again.partId).toBe(file.partId);
    await maker.delete(`/api/workshop/revisions/${revisionId}/parts/${file.partId}`).expect(204);
    expect(await readRevision(maker, revisionId)).toMatchObject({ parts: [], totalBytes: 0 });
  });

  it('keep documents, pictures and sounds beside the parts, named for what they are', async () => {
    const revisionId = await newDraft();
    const png = Buffer.from('89504e470d0a1a0a0000000d49484452', 'hex');
    const picture = await upload(maker, revisionId, 'Foto – Übersicht.jpg', png);
    expect(picture).toMatchObject({ kind: 'png', fileName: 'Foto – Übersicht.png', measuring: 'not-a-mesh' });
    const notes = await upload(maker, revisionId, 'read me.md', '# Notes\n');
    expect(notes).toMatchObject({ kind: 'text', partId: null });
    expect((await readRevision(maker, revisionId)).documents.map((one) => one.fileName)).toEqual([
      'Foto – Übersicht.png',
      'read me.md',
    ]);
  });

  describe('that are broken or hostile', () => {
    /** Which sentence each file gets, and whether before it is kept or from the measuring room. */
    const refusedAtOnce: [string, string, RegExp][] = [
      [
        'a zip renamed to .stl',
        'bad_no_model_part.3mf',
        /“.*\.stl” is a zip archive, not a 3MF file.*one by one/,
      ],
      [
        'a picture renamed to .stl',
        'bad_png_named.stl',
        /“.*\.stl” is named as a mesh, but its content is a PNG picture/,
      ],
      [
        'prose renamed to .stl',
        'bad_not_stl_text.stl',
        /“.*\.stl” is named as a mesh, but its content is plain text/,
      ],
      ['an empty file', 'bad_zero_byte.stl', /“.*\.stl” is empty/],
    ];
    const refusedByMeasuring: [string, string, RegExp][] = [
      ['a truncated binary STL', 'bad_truncated_binary.stl', /“bad_truncated_binary\.stl” .*\d/],
      ['an STL with a coordinate that is no number', 'bad_binary_nan.stl', /“bad_binary_nan\.stl” .*number/],
      [
        'an STL that counts too many triangles',
        'bad_count_too_high.stl',
        /“bad_count_too_high\.stl” .*triangles/,
      ],
      ['an STL that counts too few triangles', 'bad_count_too_low.stl', /“bad_count_too_low\.stl” .*/],
      ['an ASCII STL that breaks off', 'bad_ascii_cut.stl', /“bad_ascii_cut\.stl” .*/],
      ['a 3MF that inflates without end', 'bad_zip_bomb.3mf', /“bad_zip_bomb\.3mf” .*/],
      ['a 3MF with XML entities', 'bad_xml_entity_bomb.3mf', /“bad_xml_entity_bomb\.3mf” .*/],
      [
        'a 3MF that fetches an XML entity',
        'bad_xml_external_entity.3mf',
        /“bad_xml_external_entity\.3mf” .*/,
      ],
      ['a 3MF that breaks off', 'bad_zip_truncated.3mf', /“bad_zip_truncated\.3mf” .*/],
      ['a file that is no zip named .3mf', 'bad_component_bomb.3mf', /“bad_component_bomb\.3mf” .*/],
    ];
    let revisionId: string;
    beforeAll(async () => {
      revisionId = await newDraft();
      await upload(maker, revisionId, 'G-01 Good.stl', boxStl(5, 6, 7));
    });
    afterAll(async () => {
      const good = (await readRevision(maker, revisionId)).parts.find((part) => part.code === 'G-01');
      expect(good?.file?.measuring).toBe('measured');
    });

    it.each(refusedAtOnce)(
      '%s is refused with a sentence and nothing of it is kept',
      async (_, name, sentence) => {
        const contents = await reference(name);
        const { body } = await sendFile(maker, revisionId, name.replace('.3mf', '.stl'), contents).expect(
          422,
        );
        expect(body.code).toBe('file-refused');
        expect(body.detail).toMatch(sentence);
        expect(await storedFile(sha256(contents))).toBeNull();
      },
    );

    it.each(refusedByMeasuring)(
      '%s is refused by the measuring room with a sentence',
      async (_, name, sentence) => {
        const file = await upload(maker, revisionId, name, await reference(name));
        await shop.drain();
        const revision = await readRevision(maker, revisionId);
        const part = revision.parts.find((one) => one.file?.id === file.id)!;
        expect(part.file).toMatchObject({ measuring: 'refused', measurement: null });
        expect(part.file!.fault).toMatch(sentence);
        expect(revision.gates.find((gate) => gate.name === 'parts-measured')).toMatchObject({
          state: 'open',
        });
        await maker.delete(`/api/workshop/revisions/${revisionId}/parts/${part.id}`).expect(204);
      },
    );

    it.each([
      ['../J-01.stl', /climbs out of its folder/],
      ['..\\J-01.stl', /climbs out of its folder/],
      ['/etc/J-01.stl', /absolute path/],
      ['C:\\J-01.stl', /absolute path/],
      ['parts/J-01.stl', /carries a path/],
      ['J-01\u202elts.stl', /turns the reading direction/],
      ['J-01\n.stl', /control character/],
      ['NUL.stl', /device of Windows/],
    ])('the name %j is refused with a sentence', async (name, sentence) => {
      const { body } = await sendFile(maker, revisionId, name, boxStl(5, 6, 8)).expect(422);
      expect(body.code).toBe('file-refused');
      expect(body.detail).toMatch(sentence);
    });

    it.each([
      ['page.html', '<!DOCTYPE html><title>x</title>', /web page/],
      ['logo.svg', '<?xml version="1.0"?>\n<svg xmlns="http://www.w3.org/2000/svg"/>', /SVG/],
      ['run.txt', '#!/bin/sh\necho', /program script/],
      ['setup.stl', 'MZ\u0090\u0000\u0003', /program for Windows/],
      ['blob.bin', Buffer.from([1, 2, 3, 0, 255]), /none of the kinds/],
    ])('%s is refused for its contents', async (name, contents, sentence) => {
      const { body } = await sendFile(maker, revisionId, name, contents as Buffer).expect(422);
      expect(body.detail).toMatch(sentence);
    });

    it('a file above the limit is refused while it streams', async () => {
      const { body } = await sendFile(maker, revisionId, 'big.md', 'a'.repeat(300_001)).expect(413);
      expect(body).toMatchObject({ code: 'file-too-large' });
      expect(body.detail).toMatch(/“big.md” is larger than 293.0 KiB/);
    });

    it('files that make the revision too large are refused, the others stay', async () => {
      const full = await newDraft();
      await upload(maker, full, 'a.md', 'a'.repeat(299_000));
      await upload(maker, full, 'b.md', 'b'.repeat(299_000));
      const { body } = await sendFile(maker, full, 'c.md', 'c'.repeat(299_000)).expect(413);
      expect(body).toMatchObject({ code: 'revision-too-large' });
      expect((await readRevision(maker, full)).documents.map((one) => one.fileName)).toEqual([
        'a.md',
        'b.md',
      ]);
      await upload(maker, full, 'b.md', 'd'.repeat(299_500));
    });

    it('contents with another hash than announced count as broken off', async () => {
      const { body } = await sendFile(maker, revisionId, 'J-05.stl', boxStl(5, 5, 5))
        .set('X-Content-Sha256', 'cd'.repeat(32))
        .expect(400);
      expect(body.code).toBe('upload-broken-off');
      expect(await storedFile(sha256(boxStl(5, 5, 5)))).toBeNull();
      await maker
        .post(`/api/workshop/revisions/${revisionId}/files`)
        .field('sha256', sha256(boxStl(5, 5, 5)))
        .attach('file', boxStl(5, 5, 5), 'J-05.stl')
        .expect(201);
    });

    it('a request without a file is told where to put it', async () => {
      await maker.post(`/api/workshop/revisions/${revisionId}/files`).field('name', 'x').expect(422);
      await maker
        .post(`/api/workshop/revisions/${revisionId}/files`)
        .attach('other', Buffer.from('x'), 'x.md')
        .expect(400);
    });
  });
});
