import type { RevisionDetail } from '@windchest/contracts';
import { selectRows, touchRows } from '../../database/rows.js';
import {
  boxStl,
  draftKit,
  gateOf,
  leakingBoxStl,
  offerLicence,
  readRevision,
  release,
  startRevision,
  upload,
  writeNotes,
} from '../../testing/maker.js';
import { signInAs } from '../../testing/sign-in.js';
import { startTestApp, type Browser, type TestApp } from '../../testing/test-app.js';

describe('waivers', () => {
  let shop: TestApp;
  let maker: Browser;
  beforeAll(async () => {
    shop = await startTestApp();
    maker = await signInAs(shop, 'maker');
  });
  afterAll(() => shop.stop());

  /** All it needs to be released but a lid. */
  const leakingDraft = async (): Promise<{ kitId: string; slug: string; draft: RevisionDetail }> => {
    const { id: kitId, slug } = await draftKit(maker, 'Leaking');
    await offerLicence(maker, kitId);
    const { id } = await startRevision(maker, kitId);
    await upload(maker, id, 'J-01 Tongue.stl', leakingBoxStl(20, 30, 40));
    await writeNotes(maker, id, { assemblyNotes: 'Glue [[J-01]].' });
    await shop.drain();
    return { kitId, slug, draft: await readRevision(maker, id) };
  };
  const at = (revisionId: string, gate = 'watertight') =>
    `/api/workshop/revisions/${revisionId}/waivers/${gate}`;
  const reason = 'The lid is left off on purpose; slicers close it.';
  const waive = async (revisionId: string): Promise<RevisionDetail> =>
    (await maker.put(at(revisionId)).send({ reason }).expect(200)).body as RevisionDetail;

  it('let a revision out whose gate is open, and go down with it for good', async () => {
    const { kitId, slug, draft } = await leakingDraft();
    const fault = gateOf(draft, 'watertight');
    expect(fault).toMatchObject({ state: 'open', mayBeWaived: true, waiver: null });
    await maker.post(`/api/workshop/revisions/${draft.id}/release`).expect(409);

    expect(gateOf(await waive(draft.id), 'watertight')).toMatchObject({
      state: 'waived',
      reason: fault.reason,
      waiver: { by: expect.any(String), at: expect.any(String), reason, against: fault.reason },
    });
    const released = await release(shop, maker, draft.id);
    expect(released.state).toBe('released');
    expect(gateOf(released, 'watertight')).toMatchObject({ state: 'waived', waiver: { reason } });

    const late = await maker.put(at(draft.id)).send({ reason }).expect(409);
    expect(late.body.code).toBe('revision-is-released');
    await maker.delete(at(draft.id)).expect(409);
    await expect(
      touchRows(shop.database, 'DELETE FROM gate_waivers WHERE revision_id = :id', { id: draft.id }),
    ).rejects.toThrow('A released revision never changes.');

    // The shop's own pages tell nothing of it.
    await maker.patch(`/api/workshop/kits/${kitId}`).send({ isListed: true }).expect(200);
    const page = await shop.browser().get(`/api/kits/${slug}`).expect(200);
    expect(page.text).not.toContain('left off on purpose');

    const deeds = await selectRows<{ what: string; after_json: unknown }>(
      shop.database,
      `SELECT what, after_json FROM staff_log WHERE subject LIKE 'Leaking Mk 1.0%' ORDER BY id`,
    );
    expect(deeds.map((deed) => deed.what)).toEqual(
      expect.arrayContaining(['waived the gate watertight', 'asked for a release']),
    );
    expect(JSON.stringify(deeds.find((deed) => deed.what === 'asked for a release'))).toContain(
      'left off on purpose',
    );
  });

  it('cover what they were written against, are needless once it is mended, and may be taken back', async () => {
    const { draft } = await leakingDraft();
    await waive(draft.id);
    await upload(maker, draft.id, 'J-02 Other tongue.stl', leakingBoxStl(9, 9, 9));
    await shop.drain();
    const other = gateOf(await readRevision(maker, draft.id), 'watertight');
    expect(other).toMatchObject({ state: 'open', waiver: { reason } });
    expect(other.reason).toContain('J-02');
    await maker.post(`/api/workshop/revisions/${draft.id}/release`).expect(409);

    expect(gateOf(await waive(draft.id), 'watertight').state).toBe('waived');
    await upload(maker, draft.id, 'J-01 Tongue.stl', boxStl(20, 30, 40));
    await upload(maker, draft.id, 'J-02 Other tongue.stl', boxStl(9, 9, 9));
    await shop.drain();
    expect(gateOf(await readRevision(maker, draft.id), 'watertight')).toMatchObject({
      state: 'passed',
      waiver: { reason },
    });
    const refused = await maker.put(at(draft.id)).send({ reason }).expect(409);
    expect(refused.body.detail).toContain('there is nothing to waive');

    const { body } = await maker.delete(at(draft.id)).expect(200);
    expect(gateOf(body as RevisionDetail, 'watertight').waiver).toBeNull();
    await maker.delete(at(draft.id)).expect(404);
  });

  it('that nothing needs do not go down with the revision', async () => {
    const { draft } = await leakingDraft();
    await waive(draft.id);
    await upload(maker, draft.id, 'J-01 Tongue.stl', boxStl(20, 30, 40));
    await shop.drain();
    const released = await release(shop, maker, draft.id);
    expect(released.state).toBe('released');
    expect(gateOf(released, 'watertight')).toMatchObject({ state: 'passed', waiver: null });
  });

  it('want a reason, a gate that may be waived, and somebody who may release', async () => {
    const { draft } = await leakingDraft();
    const short = await maker.put(at(draft.id)).send({ reason: '  too short ' }).expect(422);
    expect(short.body.fields.reason).toContain('at least 10 characters');
    await maker
      .put(at(draft.id))
      .send({ reason: 'x'.repeat(501) })
      .expect(422);
    await maker.put(at(draft.id, 'lunch')).send({ reason }).expect(404);
    await writeNotes(maker, draft.id, { cautions: '' });
    for (const gate of ['cautions', 'licence-and-price', 'assembly-notes', 'parts-measured'] as const) {
      const { body } = await maker.put(at(draft.id, gate)).send({ reason }).expect(409);
      expect(body.detail).toContain(`The gate ${gate} cannot be waived`);
    }
    const helper = await signInAs(shop, 'helper');
    await helper.put(at(draft.id)).send({ reason }).expect(403);
  });
});
