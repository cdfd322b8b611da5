import type Stripe from 'stripe';
import type { Settings } from './options.js';
import { VirtualClock } from './state/clock.js';
import { Random } from './state/random.js';
import { loadState, saveState } from './state/snapshot.js';
import type { State } from './state/state.js';

/** Who caused a change: the API call that did, or nobody (a buyer on the page, the clock). */
export type Cause = { requestId: string; idempotencyKey: string | null } | null;

/** What every part of the stand-in works with: settings, state, time, chance. */
export class StandIn {
  readonly state: State;
  readonly clock = new VirtualClock();
  /** For ids. */
  readonly ids: Random;
  /** For loss and order of webhooks: apart from `ids`, so that reseeding it cannot repeat an id. */
  readonly weather: Random;
  /** Told of each new event; set by the webhook sender. */
  onEvent: (event: Stripe.Event) => void = () => {};

  /** Called when a moment that was asked for has come; set where the stand-in is started. */
  onWake: () => void = () => {};
  private readonly alarms = new Set<NodeJS.Timeout>();
  /** Test clock -> real time at which it arrives. One that was on its way at a restart arrives at once. */
  private readonly arrivals = new Map<string, number>();

  constructor(readonly settings: Settings) {
    this.state = loadState(settings.stateFile, settings.seed);
    this.clock.offsetMs = this.state.clockOffsetMs;
    this.ids = new Random(this.state.idRandomState);
    this.weather = new Random(this.state.weatherRandomState);
  }

  newId(prefix: string): string {
    // Checkout sessions alone say in their id that they are of the test mode, and are longer.
    return prefix === 'cs' ? `cs_test_${this.ids.word(58)}` : `${prefix}_${this.ids.word(24)}`;
  }

  /** Lets a test clock arrive a moment from now. */
  sendOff(clockId: string, travelMs: number): void {
    this.arrivals.set(clockId, Date.now() + travelMs);
    const alarm = setTimeout(() => {
      this.alarms.delete(alarm);
      this.onWake();
    }, travelMs + 1);
    this.alarms.add(alarm.unref());
  }

  hasArrived(clockId: string): boolean {
    return (this.arrivals.get(clockId) ?? 0) <= Date.now();
  }

  /** Nothing happens by itself any more. */
  stop(): void {
    for (const alarm of this.alarms) clearTimeout(alarm);
  }

  /** Puts the state on disk if a file is set. Called at the end of everything that may have changed it. */
  save(): void {
    this.state.clockOffsetMs = this.clock.offsetMs;
    this.state.idRandomState = this.ids.state;
    this.state.weatherRandomState = this.weather.state;
    if (this.settings.stateFile) saveState(this.settings.stateFile, this.state);
  }
}
