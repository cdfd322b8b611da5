import type { Cause, StandIn } from '../stand-in.js';
import type { Fields } from './fields.js';

export type ApiCall = {
  standIn: StandIn;
  /** The value of `:id` in the path; empty where the path has none. */
  id: string;
  fields: Fields;
  path: string;
  cause: Cause;
};

/** One address of the API. `run` returns the object or list that goes back, or throws an `ApiError`. */
export type ApiRoute = { method: 'get' | 'post' | 'delete'; path: string; run: (call: ApiCall) => object };
