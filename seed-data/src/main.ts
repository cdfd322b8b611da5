import { demoWorkshop } from './demo-workshop.js';
import { buy } from './load/buy.js';
import { giveBack } from './load/give-back.js';
import { draftKit, releaseRevision } from './load/load-kit.js';
import { reportFit } from './load/report-fit.js';
import { sayPrinted } from './load/say-printed.js';
import { makePeople } from './load/make-people.js';
import { beginPledge, makePlan } from './load/pledge.js';
import { writeLetter } from './load/write-letter.js';
import { ShopBrowser } from './load/shop-browser.js';
import { demoSignIns } from './sign-ins.js';

const { WINDCHEST_URL: shopUrl, WINDCHEST_STRIPE_URL: stripeUrl } = process.env;

const signIn = async (email: string): Promise<ShopBrowser> => {
  const browser = new ShopBrowser(shopUrl ?? '');
  const passphrase = demoSignIns.find((one) => one.email === email)?.passphrase ?? '';
  await browser.post('/session', { email, passphrase });
  return browser;
};

const say = (text: string): boolean => process.stdout.write(`${text}\n`);

/** Fills a running, empty shop with the demo workshop, over the same routes that its pages use. */
const main = async (): Promise<void> => {
  if (!shopUrl || !stripeUrl)
    throw new Error(
      'Set WINDCHEST_URL and WINDCHEST_STRIPE_URL to a running shop and its payment stand-in; `npm start` does.',
    );
  await makePeople(process.env);
  const maker = await signIn(demoSignIns.find((one) => one.role === 'maker')?.email ?? '');

  const bookkeeper = await signIn(demoSignIns.find((one) => one.role === 'bookkeeper')?.email ?? '');

  const kitIds = new Map<string, string>();
  for (const kit of demoWorkshop.kits) {
    const kitId = await draftKit(maker, kit);
    kitIds.set(kit.slug, kitId);
    const [first] = kit.revisions;
    if (first) await releaseRevision(maker, kitId, kit, first);
    await maker.patch(`/workshop/kits/${kitId}`, { isListed: true });
    say(`${kit.name} ${first?.label} is released`);
  }

  for (const { ownerEmail, ...printer } of demoWorkshop.printers)
    await (await signIn(ownerEmail)).post('/account/printers', { ...printer, isMain: false });

  for (const { kitSlugs, ...coupon } of demoWorkshop.coupons)
    await maker.post('/workshop/coupons', {
      ...coupon,
      kitIds: kitSlugs.map((slug) => kitIds.get(slug) ?? ''),
      startsAt: null,
      endsAt: null,
      isActive: true,
    });

  for (const { kitSlug, ...words } of demoWorkshop.posts) {
    const kitId = kitSlug === null ? null : (kitIds.get(kitSlug) ?? null);
    const { id } = await maker.post<{ id: string }>('/workshop/posts', { ...words, kitId });
    await maker.post(`/workshop/posts/${id}/publication`);
  }

  for (const purchase of demoWorkshop.purchases) {
    const person = demoWorkshop.people.find((one) => one.email === purchase.buyerEmail);
    if (!person) continue;
    const orderId = await buy(await signIn(person.email), person, purchase, stripeUrl);
    say(`${person.name} bought ${purchase.lines.map((line) => line.kitSlug).join(', ')}`);
    if (purchase.givenBack) await giveBack(bookkeeper, orderId, purchase.givenBack);
  }

  const planIds = new Map<string, string>();
  for (const plan of demoWorkshop.plans) planIds.set(plan.name, await makePlan(maker, plan, kitIds));
  for (const pledge of demoWorkshop.pledges) {
    const person = demoWorkshop.people.find((one) => one.email === pledge.supporterEmail);
    if (person)
      await beginPledge(
        await signIn(person.email),
        person,
        planIds.get(pledge.planName) ?? '',
        pledge,
        stripeUrl,
      );
    say(`${person?.name} pledges to ${pledge.planName}`);
  }

  for (const report of demoWorkshop.fitReports)
    await reportFit(await signIn(report.buyerEmail), maker, report);

  for (const one of demoWorkshop.prints) await sayPrinted(await signIn(one.buyerEmail), one);

  for (const kit of demoWorkshop.kits)
    for (const revision of kit.revisions.slice(1)) {
      await releaseRevision(maker, kitIds.get(kit.slug) ?? '', kit, revision);
      say(`${kit.name} ${revision.label} is released`);
    }

  for (const email of demoWorkshop.newsReaders)
    await (await signIn(email)).put('/account/news', { isWanted: true });
  for (const letter of demoWorkshop.letters) await writeLetter(maker, letter, kitIds);
};

main().catch((fault: unknown) => {
  console.error(fault instanceof Error ? fault.message : fault);
  process.exit(1);
});
