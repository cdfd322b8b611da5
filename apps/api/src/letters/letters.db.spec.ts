import type { AudienceAnswer, Letter, LetterBody } from '@windchest/contracts';
import { MailPutOff, MailRefused } from '../adapters/mailer/mailer.js';
import { newId } from '../database/columns.js';
import { selectRows, touchRows } from '../database/rows.js';
import { putKitOnSale, type KitOnSale } from '../testing/kit-on-sale.js';
import { letterOf, putFitReport, putPrinter } from '../testing/letters.js';
import { putOnShelf } from '../testing/released-revision.js';
import { putShapes } from '../testing/revision-with-shapes.js';
import { makePerson, signInAs, TEST_PASSPHRASE } from '../testing/sign-in.js';
import { startTestApp, type Browser, type TestApp } from '../testing/test-app.js';

describe('letters about a fix', () => {
  let shop: TestApp;
  let kit: KitOnSale;
  let maker: Browser;
  let helper: Browser;
  const revisions: Record<string, string> = {};
  const people: Record<string, { id: string; email: string }> = {};

  beforeAll(async () => {
    shop = await startTestApp();
    kit = await putKitOnSale(shop, { name: 'Curlew' });
    const tight = { mark: 'reprint needed', reason: 'Too tight in PETG' } as const;
    const whistles = { mark: 'reprint if it troubles you', reason: 'Whistled in the top octave' } as const;
    const rattles = { mark: 'reprint needed', reason: 'Rattled on its felt' } as const;
    const put = async (issue: number, parts: Parameters<typeof putShapes>[3]) =>
      (revisions[`1.${issue}`] = await putShapes(shop, kit.kitId, issue, parts));
    await put(5, [
      { code: 'J-01', shape: 'a', quantity: 2 },
      { code: 'R-01', shape: 'a' },
      { code: 'B-01', shape: 'a' },
    ]);
    await put(6, [
      { code: 'J-01', shape: 'a', quantity: 2 },
      { code: 'R-01', shape: 'b', ...whistles },
      { code: 'B-01', shape: 'a' },
    ]);
    await put(7, [
      { code: 'J-01', shape: 'b', quantity: 2, ...tight },
      { code: 'R-01', shape: 'b' },
      { code: 'B-01', shape: 'a' },
    ]);
    await put(8, [
      { code: 'J-01', shape: 'b', quantity: 2 },
      { code: 'R-01', shape: 'b' },
      { code: 'B-01', shape: 'b', ...rattles },
    ]);
    await put(9, [
      { code: 'J-01', shape: 'b', quantity: 2 },
      { code: 'R-01', shape: 'b' },
      { code: 'B-01', shape: 'b' },
    ]);
    for (const [name, held] of Object.entries({
      wren: '1.5',
      sedge: '1.6',
      teal: '1.7',
      plover: '1.8',
      knot: '1.9',
      ruff: '',
      gone: '1.5',
      dead: '1.5',
    })) {
      people[name] = await makePerson(shop, 'buyer', `${name}@mail.example`);
      await putOnShelf(shop, people[name], kit.kitId, held === '' ? null : revisions[held]!);
    }
    await touchRows(shop.database, `UPDATE people SET name = 'Wren' WHERE email = 'wren@mail.example'`);
    await touchRows(
      shop.database,
      `UPDATE entitlements SET state = 'ended' WHERE email = 'gone@mail.example'`,
    );
    await touchRows(
      shop.database,
      `INSERT INTO dead_addresses (id, email, reason, since) VALUES (:id, 'dead@mail.example', '5.1.1', :now)`,
      { id: newId(), now: shop.clock.now() },
    );
    // Somebody who bought without an account holds Mk 1.5 too.
    await touchRows(
      shop.database,
      `INSERT INTO entitlements (id, email, kit_id, source, order_id, held_revision_id, created_at, updated_at)
       VALUES (:id, 'guest@mail.example', :kitId, 'purchase', :orderId, :held, :now, :now)`,
      { id: newId(), orderId: newId(), kitId: kit.kitId, held: revisions['1.5'], now: shop.clock.now() },
    );
    maker = await signInAs(shop, 'maker', 'maker@saltmarsh.example');
    helper = await signInAs(shop, 'helper');
  });
  afterAll(() => shop.stop());
  beforeEach(() => (shop.mailer.sent.length = 0));

  const draft = async (body: LetterBody, by = maker): Promise<Letter> =>
    (await by.post('/api/workshop/letters').send(body).expect(201)).body as Letter;
  const read = async (id: string): Promise<Letter> =>
    (await maker.get(`/api/workshop/letters/${id}`).expect(200)).body as Letter;
  const reach = async (letter: LetterBody, show = 'readers'): Promise<AudienceAnswer> =>
    (await maker.post('/api/workshop/letters/audience').send({ letter, show }).expect(200))
      .body as AudienceAnswer;
  const send = async (id: string): Promise<void> => {
    await maker.post(`/api/workshop/letters/${id}/sending`).send({ sendAt: null }).expect(200);
    await shop.drain();
  };
  const reasonsOf = ({ leftOut }: Pick<Letter, 'leftOut'>): Record<string, number> =>
    Object.fromEntries(leftOut.map(({ reason, count }) => [reason, count]));

  it('says before sending who gets it, who does not, and why', async () => {
    const answer = await reach(letterOf(kit.kitId));
    expect(answer.readers.items.map(({ email, held, pieces }) => [email, held, pieces])).toEqual([
      ['guest@mail.example', 'Mk 1.5', 4],
      ['sedge@mail.example', 'Mk 1.6', 3],
      ['teal@mail.example', 'Mk 1.7', 1],
      ['wren@mail.example', 'Mk 1.5', 4],
    ]);
    expect(answer.size).toBe(4);
    expect(reasonsOf(answer)).toEqual({
      'right-ended': 1,
      'address-dead': 1,
      'has-newest': 1,
      'nothing-to-reprint': 1,
      'fetched-nothing': 1,
    });
    const { readers } = await reach(letterOf(kit.kitId), 'left-out');
    expect(readers.items.find(({ email }) => email === 'plover@mail.example')?.leftOut).toBe(
      'nothing-to-reprint',
    );
  });

  it('builds an audience from facts', async () => {
    const emails = async (audience: Partial<LetterBody['audience']>) =>
      (await reach(letterOf(kit.kitId, { audience, leavesOutUnneeded: false }))).readers.items.map(
        ({ email }) => email.split('@')[0],
      );
    expect(
      await emails({ heldFromId: revisions['1.6']!, heldToId: revisions['1.7']!, withNothingHeld: false }),
    ).toEqual(['sedge', 'teal']);
    expect(await emails({ sources: ['purchase'] })).toEqual(['guest']);
    await putFitReport(shop, people['sedge']!.id, { kitId: kit.kitId, revisionId: revisions['1.6']! });
    await putPrinter(shop, people['teal']!.id);
    expect(await emails({ reportedParts: ['J-01'] })).toEqual(['sedge']);
    expect(await emails({ materials: ['PETG', 'ASA'] })).toEqual(['sedge', 'teal']);
    expect(await emails({ nozzlesMm: [0.6] })).toEqual(['teal']);
    expect(await emails({ countries: ['DE'] })).toEqual([]);
    const { body } = await helper.get('/api/workshop/letters/choices').expect(200);
    expect(body).toMatchObject({ materials: ['ASA', 'PETG'], nozzlesMm: [0.4, 0.6] });
  });

  it('mails each reader exactly their own list, and keeps a record of everybody', async () => {
    const { id } = await draft(letterOf(kit.kitId));
    await send(id);
    const codesTo = (address: string): string[] =>
      [...new Set(shop.mailer.lastTo(address).text.match(/\b[A-Z]-\d\d\b/g) ?? [])].sort();
    expect(shop.mailer.sent.map(({ to }) => to).sort()).toEqual(
      ['guest', 'sedge', 'teal', 'wren'].map((name) => `${name}@mail.example`),
    );
    expect(codesTo('wren@mail.example')).toEqual(['B-01', 'J-01', 'R-01']);
    expect(codesTo('sedge@mail.example')).toEqual(['B-01', 'J-01']);
    expect(codesTo('teal@mail.example')).toEqual(['B-01']);
    const mail = shop.mailer.lastTo('wren@mail.example');
    expect(mail.subject).toBe('Curlew: what Mk 1.9 mends');
    expect(mail.text).toContain('Hello Wren,');
    expect(mail.text).toContain('you hold Mk 1.5.');
    expect(mail.text).toMatch(/J-01 Part J-01 × 2\n {2}Too tight in PETG/);
    expect(mail.text).toMatch(/only if the old ones trouble you:\n\n- R-01/);
    expect(mail.text).toContain('You get this because you have the files of Curlew');
    expect(mail.headers?.['List-Unsubscribe']).toBeUndefined();
    const token = shop.mailer.tokenFor('guest@mail.example', '/collect');
    expect((await shop.browser().get(`/api/collect/${token}`)).status).not.toBe(500);

    const letter = await read(id);
    expect(letter).toMatchObject({ state: 'sent', counts: { sent: 4, leftOut: 5, queued: 0 } });
    expect(reasonsOf(letter)['nothing-to-reprint']).toBe(1);
    const { text } = await maker.get(`/api/workshop/letters/${id}/recipients.csv?state=left-out`).expect(200);
    expect(text).toContain('plover@mail.example,Test buyer,Mk 1.8,left-out,nothing-to-reprint');
    const again = await maker.post(`/api/workshop/letters/${id}/sending`).send({ sendAt: null }).expect(409);
    expect(again.body.code).toBe('letter-is-final');
  });

  it('is read again by whom it was written to, and by nobody else', async () => {
    const browserOf = async (name: string): Promise<Browser> => {
      const browser = shop.browser();
      await browser
        .post('/api/session')
        .send({ email: `${name}@mail.example`, passphrase: TEST_PASSPHRASE })
        .expect(200);
      return browser;
    };
    const wren = await browserOf('wren');
    const { body } = await wren.get('/api/account/letters').expect(200);
    expect(body.items).toMatchObject([{ subject: 'Curlew: what Mk 1.9 mends', kind: 'service' }]);
    const own = await wren.get(`/api/account/letters/${body.items[0].id}`).expect(200);
    expect(own.body.body).toContain('**J\\-01** Part J\\-01 × 2');
    const teal = await browserOf('teal');
    await teal.get(`/api/account/letters/${body.items[0].id}`).expect(404);
    expect((await shop.browser().get('/api/letters')).body.total).toBe(0);
  });

  it('may be drafted by a helper and sent by the maker alone', async () => {
    const { id } = await draft(letterOf(kit.kitId), helper);
    await helper.post(`/api/workshop/letters/${id}/sending`).send({ sendAt: null }).expect(403);
    await helper.post(`/api/workshop/letters/${id}/test`).send({ reader: people['sedge']!.id }).expect(202);
    await shop.drain();
    expect(shop.mailer.sent.map(({ subject }) => subject)).toEqual(['Test: Curlew: what Mk 1.9 mends']);
    expect(shop.mailer.sent[0]?.text).toContain('you hold Mk 1.6.');
    const preview = await helper.get(`/api/workshop/letters/${id}/preview.html?reader=${people['wren']!.id}`);
    expect(preview.headers['content-security-policy']).toContain("default-src 'none'");
    expect(preview.text).toContain('Part J-01');
    await helper.delete(`/api/workshop/letters/${id}`).expect(204);
    const [entry] = await selectRows<{ what: string }>(
      shop.database,
      'SELECT what FROM staff_log ORDER BY id DESC LIMIT 1',
    );
    expect(entry?.what).toBe('deleted a letter');
  });

  it('refuses what nobody can fill in, naming it', async () => {
    const wrong = await maker
      .post('/api/workshop/letters')
      .send(letterOf(kit.kitId, { body: 'Hello {nmae}' }))
      .expect(422);
    expect(wrong.body.fields.body).toContain('{nmae}');
    const { body } = await maker.post('/api/workshop/letters').send(letterOf(null)).expect(422);
    expect(body.fields.kitId).toContain('choose the kit');
  });

  it('waits for its time, is taken back before it, paused and broken off half way', async () => {
    const { id } = await draft(letterOf(kit.kitId, { perMinute: 1 }));
    const at = new Date(shop.clock.now().getTime() + 3_600_000).toISOString();
    const steer = (act: string, body: object = {}) =>
      maker.post(`/api/workshop/letters/${id}/${act}`).send(body);
    expect((await steer('sending', { sendAt: at }).expect(200)).body.state).toBe('scheduled');
    await shop.drain();
    expect((await steer('cancellation').expect(200)).body.state).toBe('draft');
    shop.clock.advance(3700);
    await shop.drain();
    expect((await read(id)).state).toBe('draft');

    await send(id);
    // One a minute: the first at once, the others in their turn.
    expect(shop.mailer.sent).toHaveLength(1);
    shop.clock.advance(61);
    await shop.drain();
    expect(shop.mailer.sent).toHaveLength(2);
    await steer('pause').expect(200);
    shop.clock.advance(300);
    await shop.drain();
    expect(shop.mailer.sent).toHaveLength(2);
    await steer('resume').expect(200);
    await shop.drain();
    expect(shop.mailer.sent).toHaveLength(3);
    const broken = (await steer('cancellation').expect(200)).body as Letter;
    expect(broken).toMatchObject({ state: 'cancelled', counts: { sent: 3, queued: 0 } });
    expect(reasonsOf(broken)['cancelled']).toBe(1);
    shop.clock.advance(300);
    await shop.drain();
    expect(new Set(shop.mailer.sent.map(({ to }) => to)).size).toBe(3);
  });

  it('tries again what a server puts off, gives up what it refuses, and sends nothing twice', async () => {
    const { id } = await draft(letterOf(kit.kitId));
    const deliver = shop.mailer.send.bind(shop.mailer);
    const tries: string[] = [];
    shop.mailer.send = async (mail, steps) => {
      tries.push(mail.to);
      await steps.beforeLastLine();
      if (mail.to.startsWith('sedge')) throw new MailRefused('550 5.1.1 no such mailbox');
      if (mail.to.startsWith('wren') && tries.filter((to) => to === mail.to).length < 3)
        throw new MailPutOff('451 4.3.0 later');
      if (mail.to.startsWith('teal') && tries.filter((to) => to === mail.to).length < 2)
        throw new Error('connection closed');
      shop.mailer.sent.push(mail);
    };
    await send(id);
    for (let minutes = 0; minutes < 5; minutes++) {
      shop.clock.advance(60);
      await shop.drain();
    }
    shop.mailer.send = deliver;
    expect(shop.mailer.sent.map(({ to }) => to.split('@')[0]).sort()).toEqual(['guest', 'teal', 'wren']);
    expect(await read(id)).toMatchObject({ state: 'sent', counts: { sent: 3, refused: 1 } });
    const dead = await helper.get('/api/workshop/dead-addresses?search=sedge').expect(200);
    expect(dead.body.items).toMatchObject([
      { email: 'sedge@mail.example', reason: '550 5.1.1 no such mailbox' },
    ]);
    await helper.delete(`/api/workshop/dead-addresses/${dead.body.items[0].id}`).expect(403);
    await maker.delete(`/api/workshop/dead-addresses/${dead.body.items[0].id}`).expect(204);
  });

  it('takes a recipient handed over before the process died as sent', async () => {
    const { id } = await draft(letterOf(kit.kitId, { perMinute: 1 }));
    await send(id);
    await touchRows(
      shop.database,
      `UPDATE letter_recipients SET state = 'handed-over', due_at = :past WHERE letter_id = :id AND state = 'queued'`,
      { id, past: shop.clock.in(-1) },
    );
    shop.clock.advance(120);
    await shop.drain();
    expect(shop.mailer.sent).toHaveLength(1);
    expect(await read(id)).toMatchObject({ state: 'sent', counts: { sent: 4 } });
  });
});
