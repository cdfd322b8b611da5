import type { StandIn } from '../stand-in.js';
import { findObject, includable } from '../resources/registry.js';
import { badParameter } from './errors.js';

type Node = Record<string, unknown>;

/** The service goes four steps deep and no further. */
const mostSteps = 4;

/**
 * Replaces ids by their objects along each path (`payment_intent.latest_charge`, `data.customer`).
 * `answer` is changed in place: hand in a copy.
 */
export function expand(standIn: StandIn, answer: object, paths: readonly string[]): void {
  for (const path of paths) {
    const steps = path.split('.');
    if (steps.length > mostSteps)
      throw badParameter(
        'expand',
        `You cannot expand more than ${mostSteps} levels of a property (${path}).`,
      );
    expandPath(standIn, answer as Node, steps, path);
  }
}

function expandPath(standIn: StandIn, node: Node, steps: readonly string[], path: string): void {
  const [step, ...rest] = steps;
  if (!step) return;
  if (node[step] === undefined) {
    const included = includable(standIn, node as { object?: string; id?: string }, step);
    if (included === undefined) throw notExpandable(path);
    node[step] = included;
  }
  const value = node[step];
  if (typeof value === 'string') {
    const object = findObject(standIn, value);
    if (object === undefined) throw notExpandable(path);
    node[step] = structuredClone(object);
  } else if (rest.length === 0 && (value === null || typeof value !== 'object')) {
    // A null is a reference that is empty for now; a number or a truth value never was one.
    if (value !== null) throw notExpandable(path);
  }
  const next = node[step];
  if (next === null) return;
  if (Array.isArray(next)) for (const entry of next as Node[]) expandPath(standIn, entry, rest, path);
  else expandPath(standIn, next as Node, rest, path);
}

function notExpandable(path: string): Error {
  return badParameter('expand', `This property cannot be expanded (${path}).`);
}
