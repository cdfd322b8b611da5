import { execFile } from 'node:child_process';
import { createHash } from 'node:crypto';
import { mkdir, mkdtemp, readFile, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { dirname, join } from 'node:path';
import { buffer } from 'node:stream/consumers';
import { promisify } from 'node:util';
import type { RevisionDetail } from '@windchest/contracts';
import yauzl from 'yauzl';
import { keyOf, Storage } from '../../adapters/storage/storage.js';
import { selectRows, touchRows } from '../../database/rows.js';
import {
  boxStl,
  compare,
  draftKit,
  gateOf,
  offerLicence,
  readRevision,
  reExported,
  release,
  releasedKit,
  sendFile,
  startRevision,
  upload,
  writeNotes,
} from '../../testing/maker.js';
import { signInAs } from '../../testing/sign-in.js';
import { startTestApp, type Browser, type TestApp } from '../../testing/test-app.js';
import { CatalogueReader } from '../catalogue-reader.js';
import { BuildRelease } from './build-release.js';

const run = promisify(execFile);

/** Unpacks a zip into memory. */
const unzip = (zip: Buffer): Promise<Map<string, Buffer>> =>
  new Promise((resolve, reject) => {
    const found = new Map<string, Buffer>();
    yauzl.fromBuffer(zip, { lazyEntries: true, strictFileNames: true }, (fault, file) => {
      if (fault) return reject(fault);
      file.on('error', reject);
      file.on('end', () => resolve(found));
      file.on('entry', (entry: yauzl.Entry) => {
        file.openReadStream(entry, (closed, contents) => {
          if (closed) return reject(closed);
          buffer(contents).then((bytes) => {
            found.set(entry.fileName, bytes);
            file.readEntry();
          }, reject);
        });
      });
      file.readEntry();
    });
  });

describe('releases', () => {
  let shop: TestApp;
  let maker: Browser;
  beforeAll(async () => {
    shop = await startTestApp();
    maker = await signInAs(shop, 'maker');
  });
  afterAll(() => shop.stop());

  const bundleOf = async (revision: RevisionDetail): Promise<Buffer> =>
    buffer(await shop.app.get(Storage).get(keyOf('bundles', revision.bundle!.sha256)));

  it('name every open gate and change nothing', async () => {
    const { id } = await draftKit(maker);
    const draft = await startRevision(maker, id);
    const { body } = await maker.post(`/api/workshop/revisions/${draft.id}/release`).expect(409);
    expect(body.code).toBe('gates-are-open');
    for (const gate of ['parts-measured', 'assembly-notes', 'licence-and-price'])
      expect(body.detail).toContain(gate);
    expect((await readRevision(maker, draft.id)).release.state).toBe('not-started');
  });

  it('put a verified bundle into the store and the revision into the shop', async () => {
    const { kit, revision } = await releasedKit(shop, maker);
    expect(revision).toMatchObject({
      state: 'released',
      release: { state: 'done', percent: 100, fault: null },
    });
    const zip = await bundleOf(revision);
    expect(zip.length).toBe(revision.bundle!.bytes);
    expect(createHash('sha256').update(zip).digest('hex')).toBe(revision.bundle!.sha256);
    const files = await unzip(zip);
    expect([...files.keys()]).toEqual([
      'LICENCE-personal.md',
      'assembly-notes.md',
      'build-book.pdf',
      'cautions.md',
      'documents/Tuning table.md',
      'hardware.md',
      'manifest.json',
      'parts/H-03 Foot.stl',
      'parts/J-01 Locking tongue.stl',
      'print-specification.md',
      'SHA256SUMS',
    ]);
    expect(files.get('parts/H-03 Foot.stl')).toEqual(boxStl(60, 60, 12));
    expect(JSON.parse(files.get('manifest.json')!.toString())).toMatchObject({
      kit: { slug: kit.slug, name: 'Curlew' },
      revision: { label: 'Mk 1.0' },
      parts: [
        { code: 'H-03', quantity: 1, file: 'parts/H-03 Foot.stl', sizeMm: [60, 60, 12], volumeMm3: 43_200 },
        { code: 'J-01', file: 'parts/J-01 Locking tongue.stl' },
      ],
      documents: [{ file: 'documents/Tuning table.md' }],
    });
  });

  it('make bundles whose sums the sha256sum tool confirms', async () => {
    const { revision } = await releasedKit(shop, maker);
    const folder = await mkdtemp(join(tmpdir(), 'windchest-bundle-'));
    try {
      for (const [name, contents] of await unzip(await bundleOf(revision))) {
        await mkdir(dirname(join(folder, name)), { recursive: true });
        await writeFile(join(folder, name), contents);
      }
      const { stdout } = await run('sha256sum', ['--check', '--strict', 'SHA256SUMS'], { cwd: folder });
      expect(stdout.trim().split('\n')).toHaveLength(10);
      expect(stdout).not.toContain('FAILED');
      expect(await readFile(join(folder, 'SHA256SUMS'), 'utf8')).toMatch(
        /^[0-9a-f]{64} {2}LICENCE-personal\.md$/m,
      );
    } finally {
      await rm(folder, { recursive: true });
    }
  });

  it('build the same bytes again from the same input, also after a process died in between', async () => {
    const { id } = await draftKit(maker);
    await offerLicence(maker, id);
    const draft = await startRevision(maker, id);
    await upload(maker, draft.id, 'A-01 Arm.stl', boxStl(5, 5, 90));
    await writeNotes(maker, draft.id, { assemblyNotes: 'Glue [[A-01]].' });
    await shop.drain();
    await maker.post(`/api/workshop/revisions/${draft.id}/release`).expect(202);
    // A process that built the bundle and died before it could say so: the job is found again by another.
    const builder = shop.app.get(BuildRelease, { strict: false });
    const finish = await builder.handle({ revisionId: draft.id });
    expect(typeof finish).toBe('function');
    expect(await readRevision(maker, draft.id)).toMatchObject({
      state: 'draft',
      release: { state: 'building' },
    });
    await shop.clock.advance(120);
    const files = async (): Promise<string[]> =>
      (
        await selectRows<{ sha: string }>(
          shop.database,
          `SELECT bundle_sha256 AS sha FROM revisions WHERE id = :id`,
          { id: draft.id },
        )
      ).map((row) => row.sha);
    expect(await files()).toEqual([null]);
    await shop.drain();
    const revision = await readRevision(maker, draft.id);
    expect(revision.state).toBe('released');
    const [first] = await files();
    expect(await builder.handle({ revisionId: draft.id })).toBeUndefined();

    // The same contents once more, built from the start.
    await asIfNeverReleased(draft.id);
    await release(shop, maker, draft.id);
    expect(await files()).toEqual([first]);
  });

  /** Back to a draft, which only somebody who takes the database's guard away can do. */
  const asIfNeverReleased = async (revisionId: string): Promise<void> => {
    const [guard] = await selectRows<{ 'SQL Original Statement': string }>(
      shop.database,
      'SHOW CREATE TRIGGER revisions_released_update',
    );
    await shop.database.query('DROP TRIGGER revisions_released_update');
    await touchRows(
      shop.database,
      `UPDATE revisions SET state = 'draft', release_state = 'not-started', bundle_sha256 = NULL, bundle_bytes = NULL, released_at = NULL WHERE id = :revisionId`,
      { revisionId },
    );
    await shop.database.query(guard!['SQL Original Statement']);
  };

  it('fail with a clear fault where a file is missing from the store, and may be tried again', async () => {
    const { id } = await draftKit(maker);
    await offerLicence(maker, id);
    const draft = await startRevision(maker, id);
    const stl = boxStl(7, 7, 77);
    const file = await upload(maker, draft.id, 'B-01 Bar.stl', stl);
    await writeNotes(maker, draft.id, { assemblyNotes: 'Lay it down.' });
    await shop.drain();
    const storage = shop.app.get(Storage);
    await storage.delete(keyOf('files', file.sha256));
    const failed = await release(shop, maker, draft.id);
    expect(failed).toMatchObject({ state: 'draft', bundle: null, release: { state: 'failed' } });
    expect(failed.release.fault).toMatch(/could not be built.*no file under this key/i);
    await upload(maker, draft.id, 'B-01 Bar.stl', stl);
    expect(await release(shop, maker, draft.id)).toMatchObject({ state: 'released' });
  });

  it('refuse a bundle that the store gives back differently', async () => {
    const { id } = await draftKit(maker);
    await offerLicence(maker, id);
    const draft = await startRevision(maker, id);
    await upload(maker, draft.id, 'E-01 Edge.stl', boxStl(8, 7, 77));
    await writeNotes(maker, draft.id, { assemblyNotes: 'Lay it down.' });
    await shop.drain();
    const storage = shop.app.get(Storage);
    const get = storage.get.bind(storage);
    storage.get = async (key, range) => {
      if (!key.startsWith('bundles/') || range) return get(key, range);
      const bytes = await buffer(await get(key));
      bytes[100]! ^= 1;
      const { Readable } = await import('node:stream');
      return Readable.from([bytes]);
    };
    const failed = await release(shop, maker, draft.id);
    storage.get = get;
    expect(failed).toMatchObject({ state: 'draft', release: { state: 'failed' } });
    expect(failed.release.fault).toMatch(/does not have the hash/);
  });

  it('let a draft stand still while its bundle is being built', async () => {
    const { id } = await draftKit(maker);
    await offerLicence(maker, id);
    const draft = await startRevision(maker, id);
    await upload(maker, draft.id, 'F-01 Fipple.stl', boxStl(8, 8, 20));
    await writeNotes(maker, draft.id, { assemblyNotes: 'Glue it.' });
    await shop.drain();
    await maker.post(`/api/workshop/revisions/${draft.id}/release`).expect(202);
    const { body } = await maker
      .patch(`/api/workshop/revisions/${draft.id}`)
      .send({ cautions: 'x' })
      .expect(409);
    expect(body.code).toBe('conflict');
    await maker.post(`/api/workshop/revisions/${draft.id}/release`).expect(202);
    await shop.drain();
    expect((await readRevision(maker, draft.id)).state).toBe('released');
    const jobs = await selectRows(
      shop.database,
      `SELECT id FROM jobs WHERE name = 'catalogue.build-release' AND payload LIKE :like`,
      { like: `%${draft.id}%` },
    );
    expect(jobs).toHaveLength(1);
  });

  describe('never change', () => {
    let revision: RevisionDetail;
    beforeAll(async () => ({ revision } = await releasedKit(shop, maker, 'Fixed')));
    const snapshot = () => readRevision(maker, revision.id);

    it('through any route of the workshop', async () => {
      const address = `/api/workshop/revisions/${revision.id}`;
      const part = revision.parts[0]!;
      const partBody = {
        code: part.code,
        name: 'x',
        quantity: 9,
        orientation: 'may-lie',
        printSpec: null,
        voice: null,
      };
      const answers = [
        await maker.patch(address).send({ assemblyNotes: 'other' }),
        await maker.delete(address),
        await maker
          .post(`${address}/offers`)
          .send({ files: [{ fileName: 'x.md', sha256: 'ab'.repeat(32), bytes: 1 }] }),
        await sendFile(maker, revision.id, 'J-01 Locking tongue.stl', boxStl(1, 1, 1)),
        await maker.delete(`${address}/files/${part.file!.id}`),
        await maker.put(`${address}/parts/${part.id}`).send(partBody),
        await maker.delete(`${address}/parts/${part.id}`),
        await maker.put(`${address}/marks`).send({ code: part.code, mark: null, reason: '' }),
        await maker.post(`${address}/release`),
      ];
      for (const answer of answers)
        expect([answer.status, (answer.body as { code: string }).code]).toEqual([
          409,
          'revision-is-released',
        ]);
      expect(await snapshot()).toEqual(revision);
    });

    it.each([
      ['its notes', `UPDATE revisions SET assembly_notes = 'other' WHERE id = :id`],
      ['its number', 'UPDATE revisions SET issue = 7 WHERE id = :id'],
      ['its state, back to a draft', `UPDATE revisions SET state = 'draft' WHERE id = :id`],
      ['its bundle', `UPDATE revisions SET bundle_sha256 = REPEAT('0', 64) WHERE id = :id`],
      ['its being there', 'DELETE FROM revisions WHERE id = :id'],
      ['a part of it', 'UPDATE parts SET quantity = 2 WHERE revision_id = :id'],
      ['a part of it, by dropping it', 'DELETE FROM parts WHERE revision_id = :id'],
      [
        'its parts, by adding one',
        `INSERT INTO parts (id, revision_id, code, name, created_at, updated_at) VALUES (UUID(), :id, 'Z-01', 'x', NOW(), NOW())`,
      ],
      ['a file of it', `UPDATE revision_files SET file_name = 'x' WHERE revision_id = :id`],
      ['its files, by taking them out', 'DELETE FROM revision_files WHERE revision_id = :id'],
      [
        'its files, by adding one',
        `INSERT INTO revision_files (id, revision_id, sha256, file_name, created_at)
         SELECT UUID(), :id, sha256, 'another', NOW() FROM stored_files LIMIT 1`,
      ],
    ])('%s through the database', async (_, sql) => {
      await expect(touchRows(shop.database, sql, { id: revision.id })).rejects.toThrow(
        'A released revision never changes.',
      );
      expect(await snapshot()).toEqual(revision);
    });

    it('but by being withdrawn', async () => {
      await touchRows(
        shop.database,
        `UPDATE revisions SET state = 'withdrawn', withdrawn_reason = 'cracks' WHERE id = :id`,
        { id: revision.id },
      );
      expect((await snapshot()).state).toBe('withdrawn');
      await expect(
        touchRows(shop.database, `UPDATE revisions SET state = 'released' WHERE id = :id`, {
          id: revision.id,
        }),
      ).rejects.toThrow('never changes');
      expect(await shop.app.get(CatalogueReader).revisionsOf(revision.kit.id)).toMatchObject([
        { isWithdrawn: true },
      ]);
    });
  });

  it('cannot be faked in the database without a bundle', async () => {
    const { id } = await draftKit(maker);
    const draft = await startRevision(maker, id);
    await expect(
      touchRows(shop.database, `UPDATE revisions SET state = 'released' WHERE id = :id`, { id: draft.id }),
    ).rejects.toThrow('released with its bundle');
  });

  describe('that follow another', () => {
    it('carry everything over, one draft at a time, numbered by mark and issue', async () => {
      const { kit, revision } = await releasedKit(shop, maker, 'Follow');
      const issue = await startRevision(maker, kit.id, 'issue');
      expect(issue).toMatchObject({
        label: 'Mk 1.1',
        assemblyNotes: revision.assemblyNotes,
        changeNotes: '',
      });
      expect(issue.parts.map((part) => [part.code, part.file?.sha256])).toEqual(
        revision.parts.map((part) => [part.code, part.file?.sha256]),
      );
      const { body } = await maker
        .post(`/api/workshop/kits/${kit.id}/revisions`)
        .send({ step: 'mark' })
        .expect(409);
      expect(body).toMatchObject({
        code: 'conflict',
        detail: expect.stringContaining('Mk 1.1 is still a draft'),
      });
      await maker.delete(`/api/workshop/revisions/${issue.id}`).expect(204);
      await maker.get(`/api/workshop/revisions/${issue.id}`).expect(404);
      expect((await startRevision(maker, kit.id, 'mark')).label).toBe('Mk 2.0');
    });

    it('are compared part by part, and say in words what differs', async () => {
      const { kit, revision } = await releasedKit(shop, maker, 'Compared');
      const draft = await startRevision(maker, kit.id);
      expect((await compare(maker, draft.id)).rows.map((row) => row.difference)).toEqual(['same', 'same']);
      await upload(maker, draft.id, 'J-01 Locking tongue.stl', boxStl(20, 30, 41.5));
      await upload(maker, draft.id, 'H-03 Foot.stl', reExported(boxStl(60, 60, 12)));
      await upload(maker, draft.id, 'N-01 Nut.stl', boxStl(9, 9, 9));
      await shop.drain();
      const comparison = await compare(maker, draft.id);
      expect(comparison.with).toEqual({ id: revision.id, label: 'Mk 1.0' });
      expect(comparison.rows).toMatchObject([
        { code: 'H-03', difference: 're-exported' },
        {
          code: 'J-01',
          difference: 'changed',
          whatDiffers: '+1.50 mm height, +3.8 % volume, +2.9 % surface',
          sizeChangeMm: { x: 0, y: 0, z: 1.5 },
        },
        { code: 'N-01', difference: 'new' },
      ]);

      await maker.delete(`/api/workshop/revisions/${draft.id}/parts/${draft.parts[0]!.id}`).expect(204);
      expect((await compare(maker, draft.id)).rows.find((row) => row.code === 'H-03')).toMatchObject({
        difference: 'dropped',
      });
    });

    it('need change notes under headings, and a mark with a reason on every changed part', async () => {
      const { kit, revision } = await releasedKit(shop, maker, 'Marked');
      const draft = await startRevision(maker, kit.id);
      await upload(maker, draft.id, 'J-01 Locking tongue.stl', boxStl(20, 30, 41.5));
      await shop.drain();
      let now = await readRevision(maker, draft.id);
      expect(gateOf(now, 'change-notes').state).toBe('open');
      expect(gateOf(now, 'changes-marked')).toMatchObject({
        state: 'open',
        reason: expect.stringContaining('J-01'),
      });

      const mark = { code: 'J-01', mark: 'reprint needed', reason: '' };
      await maker.put(`/api/workshop/revisions/${draft.id}/marks`).send(mark).expect(200);
      now = await readRevision(maker, draft.id);
      expect(gateOf(now, 'changes-marked').reason).toContain('Give a reason for J-01');
      const { body } = await maker
        .put(`/api/workshop/revisions/${draft.id}/marks`)
        .send({ ...mark, reason: 'The tongue was too short to lock.' })
        .expect(200);
      expect(body.rows[1]).toMatchObject({ code: 'J-01', mark: 'reprint needed' });

      now = await readRevision(maker, draft.id);
      expect(gateOf(now, 'changes-marked').state).toBe('passed');
      await writeNotes(maker, draft.id, { changeNotes: '### Fixed\n\n- The tongue locks.' });
      const released = await release(shop, maker, draft.id);
      expect(released.state).toBe('released');

      const third = await startRevision(maker, kit.id);
      await upload(maker, third.id, 'H-03 Foot.stl', boxStl(60, 60, 13));
      await shop.drain();
      await maker
        .put(`/api/workshop/revisions/${third.id}/marks`)
        .send({ code: 'H-03', mark: 'reprint if it troubles you', reason: 'Stands firmer.' })
        .expect(200);
      await writeNotes(maker, third.id, { changeNotes: '### Changed\n\n- A thicker foot.' });
      await release(shop, maker, third.id);
      const reader = shop.app.get(CatalogueReader);
      expect(await reader.netDifferences(revision.id, third.id, null)).toMatchObject([
        {
          code: 'H-03',
          difference: 'changed',
          steps: [{ mark: 'reprint if it troubles you', reason: 'Stands firmer.' }],
        },
        {
          code: 'J-01',
          difference: 'changed',
          steps: [{ mark: 'reprint needed', reason: 'The tongue was too short to lock.' }],
          drawing: { path: expect.stringMatching(/^M/) },
        },
      ]);
      expect(await reader.netDifferences(released.id, third.id, null)).toMatchObject([
        { code: 'H-03', difference: 'changed' },
        { code: 'J-01', difference: 'same', steps: [] },
      ]);
      expect((await reader.netDifferences(null, third.id, null)).map((row) => row.difference)).toEqual([
        'new',
        'new',
      ]);
    });
  });
});
