import {
  filamentColour,
  hardwareList,
  kitBody,
  licenceBody,
  markBody,
  partBody,
  printerCardFields,
  revisionBody,
  roles,
} from '@windchest/contracts';
import { predict } from '@windchest/voicing';
import { demoSignIns, demoWorkshop } from './index.js';

const revisions = demoWorkshop.kits.flatMap((kit) =>
  kit.revisions.map((revision) => ({ kit, revision, title: `${kit.name} ${revision.label}` })),
);

describe.each(demoWorkshop.kits.map((kit) => [kit.name, kit] as const))('%s', (_name, kit) => {
  it('is taken by the shop as it stands', () => {
    expect(kitBody.parse(kit)).toMatchObject({ slug: kit.slug });
    expect(filamentColour.parse(kit.colour)).toBe(kit.colour);
    for (const licence of kit.licences) expect(licenceBody.parse(licence)).toMatchObject(licence);
  });
});

describe.each(revisions.map((one) => [one.title, one] as const))('%s', (_title, { revision }) => {
  it('is taken by the shop as it stands', () => {
    expect(revisionBody.parse(revision)).toMatchObject({ declaredCents: revision.declaredCents });
    expect(hardwareList.parse(revision.hardware)).toEqual(revision.hardware);
    for (const part of revision.parts) expect(partBody.parse(part)).toMatchObject({ code: part.code });
    for (const mark of revision.marks) expect(markBody.parse(mark)).toEqual(mark);
  });

  it('has voices within its declared cents', () => {
    const voices = revision.parts.flatMap(({ voice }) => (voice ? [voice] : []));
    expect(voices.length).toBeGreaterThan(0);
    for (const voice of voices) {
      expect(Math.abs(predict(voice, revision.room).cents)).toBeLessThan(revision.declaredCents);
    }
  });

  it('has codes and file names of its own for every part', () => {
    expect(new Set(revision.parts.map(({ code }) => code)).size).toBe(revision.parts.length);
    expect(new Set(revision.parts.map(({ fileName }) => fileName)).size).toBe(revision.parts.length);
    for (const { code, fileName, variants } of revision.parts) {
      expect(fileName).toMatch(new RegExp(`^${code}-[a-z0-9-]+\\.(stl|3mf)$`));
      for (const variant of variants)
        expect(variant.fileName).toBe(fileName.replace(/(\.[a-z0-9]+)$/, `-(${variant.clearance})$1`));
    }
  });

  it('links to parts that exist, in steps', () => {
    const codes = new Set(revision.parts.map(({ code }) => code));
    const linked = [...`${revision.assemblyNotes}${revision.changeNotes}`.matchAll(/\[\[(.+?)\]\]/g)].map(
      ([, code]) => code,
    );
    expect(linked.length).toBeGreaterThan(4);
    expect(linked.filter((code) => !codes.has(code ?? ''))).toEqual([]);
    const steps = [...revision.assemblyNotes.matchAll(/^## (\d+)\. /gm)].map(([, number]) => Number(number));
    expect(steps).toEqual(steps.map((_step, index) => index + 1));
    expect(steps.length).toBeGreaterThanOrEqual(3);
  });

  it('speaks of every part in its notes, each pipe, bar or tine at least as one of a row', () => {
    const silent = revision.parts.filter(
      ({ code, voice }) => !voice && !revision.assemblyNotes.includes(`[[${code}]]`),
    );
    expect(silent.map(({ code }) => code)).toEqual([]);
  });

  it('keeps to the headings of change notes and the four cautions', () => {
    const headings = [...revision.changeNotes.matchAll(/^### (.+)$/gm)].map(([, heading]) => heading);
    expect(headings.length).toBeGreaterThan(0);
    // The kinds of change of Keep a Changelog 1.1.0.
    const kinds = ['Added', 'Changed', 'Deprecated', 'Removed', 'Fixed', 'Security'];
    expect(headings.filter((heading) => !kinds.includes(heading ?? ''))).toEqual([]);
    for (const heading of ['Printing', 'Making', 'Playing', 'Selling prints']) {
      expect(revision.cautions).toContain(`## ${heading}\n`);
    }
  });
});

describe('the demo workshop', () => {
  const pricesOf = (slug: string) =>
    demoWorkshop.kits
      .find((kit) => kit.slug === slug)
      ?.licences.map(({ kind, priceMinor }) => [kind, priceMinor]);

  it('asks the prices it announces', () => {
    expect(pricesOf('curlew')).toEqual([
      ['personal', 2400],
      ['small-run', 9600],
      ['classroom', 6000],
    ]);
    expect(pricesOf('teal')).toEqual([
      ['personal', 900],
      ['small-run', 3600],
    ]);
    expect(pricesOf('dunlin')).toEqual([['personal', 0]]);
    expect(pricesOf('godwit')).toEqual([['personal', 1400]]);
    expect(pricesOf('turnstone')).toEqual([
      ['personal', 1600],
      ['classroom', 4800],
    ]);
  });

  it('gives coupons and purchases for kits, people and coupons it has', () => {
    const slugs = demoWorkshop.kits.map(({ slug }) => slug);
    const codes = demoWorkshop.coupons.map(({ code }) => code);
    const emails = demoWorkshop.people.filter(({ isVerified }) => isVerified).map(({ email }) => email);
    for (const { kitSlugs } of demoWorkshop.coupons) expect(slugs).toEqual(expect.arrayContaining(kitSlugs));
    for (const { buyerEmail, couponCode, lines } of demoWorkshop.purchases) {
      expect(emails).toContain(buyerEmail);
      if (couponCode !== null) expect(codes).toContain(couponCode);
      for (const { kitSlug, licence } of lines) {
        expect(pricesOf(kitSlug)?.map(([kind]) => kind)).toContain(licence);
      }
    }
  });

  it('has printers of its people, as their accounts take them', () => {
    const emails = demoWorkshop.people.map(({ email }) => email);
    for (const { ownerEmail, ...printer } of demoWorkshop.printers) {
      expect(emails).toContain(ownerEmail);
      expect(printerCardFields.parse(printer)).toEqual(printer);
    }
  });

  it('has plans of kits it has, and pledges of people it has', () => {
    const slugs = demoWorkshop.kits.map(({ slug }) => slug);
    const planNames = demoWorkshop.plans.map(({ name }) => name);
    for (const { kitSlugs } of demoWorkshop.plans)
      expect(slugs).toEqual(expect.arrayContaining(kitSlugs ?? []));
    for (const { supporterEmail, planName } of demoWorkshop.pledges) {
      expect(planNames).toContain(planName);
      const person = demoWorkshop.people.find(({ email }) => email === supporterEmail);
      expect(person?.isVerified).toBe(true);
    }
  });

  it('has a sign-in for every person and a person for every role', () => {
    expect(demoSignIns.map(({ email, role }) => [email, role])).toEqual(
      demoWorkshop.people.map(({ email, role }) => [email, role]),
    );
    expect(new Set(demoSignIns.map(({ role }) => role))).toEqual(new Set(roles));
    expect(demoWorkshop.people.filter(({ isVerified }) => !isVerified)).toHaveLength(1);
    for (const { passphrase } of demoSignIns) expect(passphrase.length).toBeGreaterThanOrEqual(15);
    for (const { email } of demoSignIns) expect(email).toMatch(/@(saltmarsh|mail)\.example$/);
  });
});
