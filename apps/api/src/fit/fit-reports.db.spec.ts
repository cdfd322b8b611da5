import type { FitMatrix, FitReport, WorkshopFitReport } from '@windchest/contracts';
import { RevisionReleasedSteps } from '../catalogue/release/revision-released-steps.js';
import { Transactions } from '../database/transactions.js';
import { putKitOnSale, type KitOnSale } from '../testing/kit-on-sale.js';
import { putOnShelf, putRevision } from '../testing/released-revision.js';
import { makePerson, signInAs, TEST_PASSPHRASE } from '../testing/sign-in.js';
import { startTestApp, type Browser, type TestApp } from '../testing/test-app.js';

/** One pixel (ISO/IEC 15948, from memory). */
const PNG = Buffer.from(
  'iVBORw0KGgoAAAANSUhEUgAAAAEAAAABCAYAAAAfFcSJAAAADUlEQVR42mNk+M9QDwADhgGAWjR9awAAAABJRU5ErkJggg==',
  'base64',
);

describe('fit reports', () => {
  let shop: TestApp;
  let kit: KitOnSale;
  let revisionId: string;
  let buyer: Browser;
  let buyerEmail: string;
  let helper: Browser;
  beforeAll(async () => {
    shop = await startTestApp();
    kit = await putKitOnSale(shop);
    revisionId = await putRevision(shop, kit.kitId, { issue: 5, partCodes: ['H-03', 'H-04'] });
    const person = await makePerson(shop, 'buyer');
    buyerEmail = person.email;
    await putOnShelf(shop, person, kit.kitId, revisionId);
    buyer = shop.browser();
    await buyer.post('/api/session').send({ email: buyerEmail, passphrase: TEST_PASSPHRASE }).expect(200);
    helper = await signInAs(shop, 'helper');
  });
  afterAll(() => shop.stop());

  const words = (more: object = {}) => ({
    revisionId,
    partCode: 'H-03',
    clearance: null,
    printerName: 'Box on the shelf',
    material: 'PETG',
    nozzleMm: 0.4,
    layerMm: 0.2,
    verdict: 'tight',
    gapMm: -0.2,
    words: 'Had to file it.',
    ...more,
  });
  const report = async (more: object = {}): Promise<FitReport> =>
    (await buyer.post(`/api/shelf/${kit.slug}/fit-reports`).send(words(more)).expect(201)).body as FitReport;
  const mailsTo = async (email: string): Promise<string[]> => {
    shop.mailer.sent.length = 0;
    await shop.drain();
    return shop.mailer.sent.filter(({ to }) => to === email).map(({ subject }) => subject);
  };

  it('are given for kits on one’s shelf only, about parts that are in the revision', async () => {
    const stranger = await signInAs(shop, 'buyer');
    await stranger.post(`/api/shelf/${kit.slug}/fit-reports`).send(words()).expect(404);
    const refused = await buyer
      .post(`/api/shelf/${kit.slug}/fit-reports`)
      .send(words({ partCode: 'X-01' }))
      .expect(422);
    expect((refused.body as { detail: string }).detail).toBe('Curlew Mk 1.5 has no part X-01.');
    expect(await report()).toMatchObject({ state: 'new', partName: 'Part H-03', gapMm: -0.2 });
  });

  it('carry a picture that only the reporter and the workshop see', async () => {
    const { id } = await report({ partCode: 'H-04' });
    const stranger = await signInAs(shop, 'buyer');
    await stranger.post(`/api/fit-reports/${id}/picture`).attach('picture', PNG, 'a.png').expect(404);
    await buyer.post(`/api/fit-reports/${id}/picture`).attach('picture', PNG, 'a.png').expect(201);
    await buyer.get(`/api/fit-reports/${id}/picture`).expect(200).expect('Content-Type', 'image/png');
    await helper.get(`/api/fit-reports/${id}/picture`).expect(200);
    await stranger.get(`/api/fit-reports/${id}/picture`).expect(404);
  });

  it('become a matrix of part and material', async () => {
    for (const gapMm of [-0.3, -0.25, -0.2, -0.2, -0.15]) await report({ gapMm });
    await report({ material: 'PLA', verdict: 'right', gapMm: null });
    const { body } = await helper.get(`/api/workshop/kits/${kit.kitId}/fit-matrix`).expect(200);
    const matrix = body as FitMatrix;
    expect(matrix.materials).toEqual(['PETG', 'PLA']);
    const row = matrix.rows.find(({ partCode }) => partCode === 'H-03');
    expect(row?.cells['PETG']).toMatchObject({
      count: 6,
      medianMm: -0.2,
      changePerSideMm: -0.1,
      certainty: 'sure',
    });
    expect(row?.cells['PLA']).toMatchObject({ count: 1, measured: 0, certainty: 'unsure' });
    const other = await helper
      .get(`/api/workshop/kits/${kit.kitId}/fit-matrix?revisionId=${kit.revisionId}`)
      .expect(200);
    expect(other.body).toEqual({ materials: [], rows: [] });
  });

  it('are answered by e-mail, once for each answer', async () => {
    const { id } = await report();
    await mailsTo(buyerEmail);
    const { body } = await helper
      .post(`/api/workshop/fit-reports/${id}/answers`)
      .send({ text: 'Take the + one.' })
      .expect(201);
    expect(body).toMatchObject({ state: 'answered', answers: [{ text: 'Take the + one.' }] });
    expect(await mailsTo(buyerEmail)).toEqual(['Curlew: about H-03 Part H-03']);
    const mine = await buyer.get(`/api/shelf/${kit.slug}/fit-reports`).expect(200);
    expect((mine.body as { items: FitReport[] }).items[0]?.answers).toHaveLength(1);
  });

  it('name the revision that mends them, and reporters hear of it when it is out, once', async () => {
    const { id } = await report();
    await helper
      .post('/api/workshop/fit-fixes')
      .send({ reportIds: [id], revisionId: kit.revisionId })
      .expect(409);
    const laterId = await putRevision(shop, kit.kitId, { issue: 6, partCodes: ['H-03'] });
    await shop.database.query(
      `UPDATE fit_reports SET state = 'planned', fixed_in_id = '${laterId}' WHERE id = '${id}'`,
    );
    const release = () =>
      shop.app.get(Transactions, { strict: false }).run((tx) =>
        shop.app.get(RevisionReleasedSteps, { strict: false }).run(tx, {
          revisionId: laterId,
          label: 'Mk 1.6',
          kit: { id: kit.kitId, slug: kit.slug, name: kit.name },
        }),
      );
    await mailsTo(buyerEmail);
    await release();
    await release();
    expect(await mailsTo(buyerEmail)).toEqual(['Curlew Mk 1.6: H-03 Part H-03 is mended']);
    const { body } = await helper.get(`/api/workshop/fit-reports/${id}`).expect(200);
    expect(body as WorkshopFitReport).toMatchObject({
      state: 'fixed',
      fixedIn: { label: 'Mk 1.6', isReleased: true },
      reporter: { email: buyerEmail },
    });
    const another = await report();
    await helper
      .post('/api/workshop/fit-fixes')
      .send({ reportIds: [another.id], revisionId: laterId })
      .expect(200, { count: 1 });
    expect(await mailsTo(buyerEmail)).toEqual(['Curlew Mk 1.6: H-03 Part H-03 is mended']);
  });

  it('are filtered, paged and written as CSV for the workshop, and closed', async () => {
    const { id } = await report({ words: '=1+1' });
    await helper.post(`/api/workshop/fit-reports/${id}/closing`).expect(200);
    const { body } = await helper.get('/api/workshop/fit-reports?state=closed&part=H-03').expect(200);
    expect(body).toMatchObject({ total: 1, items: [{ id, state: 'closed' }] });
    const csv = await helper.get('/api/workshop/fit-reports.csv?state=closed').expect(200);
    expect(csv.text.split('\r\n')).toHaveLength(3);
    expect(csv.text).toContain("'=1+1");
  });
});
