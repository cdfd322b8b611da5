import type { Plan } from './plan.js';
import { SolidBuilder, type Solid } from './solid.js';
import { triangulate } from './triangulate.js';

/** An outline at a height. */
export interface Section {
  readonly zMm: number;
  readonly plan: Plan;
}

/**
 * A hole, a blind hole or a hollow: sections from below upwards. Its ends either open in the solid's
 * underside or top, or are closed inside it.
 */
export interface Passage {
  readonly sections: readonly Section[];
  readonly opensBelow: boolean;
  readonly opensAbove: boolean;
}

/**
 * A solid drawn through outlines from below upwards. All sections of the shell have the same number of
 * corners, and so have those of one passage; two sections at one height make a step.
 */
export function loftedSolid(shell: readonly Section[], passages: readonly Passage[] = []): Solid {
  const builder = new SolidBuilder();
  addWalls(builder, shell, false);
  for (const passage of passages) {
    addWalls(builder, passage.sections, true);
    if (!passage.opensBelow) addCap(builder, first(passage.sections), [], true);
    if (!passage.opensAbove) addCap(builder, last(passage.sections), [], false);
  }
  const below = passages.filter((one) => one.opensBelow).map((one) => first(one.sections).plan);
  const above = passages.filter((one) => one.opensAbove).map((one) => last(one.sections).plan);
  addCap(builder, first(shell), below, false);
  addCap(builder, last(shell), above, true);
  return builder.build();
}

/** The same outline from one height to another, its two rims bevelled at 45°. */
export function chamfered(
  plan: Plan,
  fromZ: number,
  toZ: number,
  bevel: { belowMm: number; aboveMm: number },
  insetBy: (plan: Plan, mm: number) => Plan,
): Section[] {
  return [
    ...(bevel.belowMm > 0 ? [{ zMm: fromZ, plan: insetBy(plan, bevel.belowMm) }] : []),
    { zMm: fromZ + bevel.belowMm, plan },
    { zMm: toZ - bevel.aboveMm, plan },
    ...(bevel.aboveMm > 0 ? [{ zMm: toZ, plan: insetBy(plan, bevel.aboveMm) }] : []),
  ];
}

function addWalls(builder: SolidBuilder, sections: readonly Section[], isPassage: boolean): void {
  const rings = sections.map(({ plan, zMm }) => plan.map(([x, y]) => builder.vertex(x, y, zMm)));
  for (let level = 0; level + 1 < rings.length; level++) {
    const lower = rings[level] ?? [];
    const upper = rings[level + 1] ?? [];
    if (lower.length !== upper.length) {
      throw new Error(`Sections of ${lower.length} and ${upper.length} corners cannot be joined.`);
    }
    for (let i = 0; i < lower.length; i++) {
      const j = (i + 1) % lower.length;
      const [a, b, c, d] = [lower[i] ?? -1, lower[j] ?? -1, upper[j] ?? -1, upper[i] ?? -1];
      if (isPassage) builder.quad(a, d, c, b);
      else builder.quad(a, b, c, d);
    }
  }
}

function addCap(builder: SolidBuilder, section: Section, holes: readonly Plan[], facesUp: boolean): void {
  const corners = [...section.plan, ...holes.flat()].map(([x, y]) => builder.vertex(x, y, section.zMm));
  for (const [a, b, c] of triangulate(section.plan, holes)) {
    const [first, second, third] = facesUp ? [a, b, c] : [a, c, b];
    builder.triangle(corners[first] ?? -1, corners[second] ?? -1, corners[third] ?? -1);
  }
}

function first(sections: readonly Section[]): Section {
  const section = sections[0];
  if (!section) throw new Error('A loft needs at least one section.');
  return section;
}

function last(sections: readonly Section[]): Section {
  return first(sections.slice(-1));
}
