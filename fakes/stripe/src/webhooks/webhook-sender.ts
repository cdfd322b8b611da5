import type Stripe from 'stripe';
import type { StandIn } from '../stand-in.js';
import type { Delivery, DeliveryAttempt } from '../state/records.js';
import { postEvent } from './post-event.js';

/** How long shuffling gathers events before they go out in another order. */
const shuffleGatherMs = 250;
const keptAttempts = 2000;

export type FlushResult = { attempted: number; delivered: number; stillWaiting: number };

/**
 * Carries events to the webhook endpoint. In calm weather they go one after the other, in the order in
 * which things happened; copies and shuffled events go side by side, so that the receiver meets them at
 * the same moment. What fails is tried again later; what waits is part of the state and outlives a restart.
 */
export class WebhookSender {
  private timer: NodeJS.Timeout | undefined;
  private work: Promise<unknown> = Promise.resolve();
  private readonly stopping = new AbortController();

  constructor(private readonly standIn: StandIn) {
    standIn.onEvent = (event) => this.take(event);
    this.plan();
  }

  /** A new event: lost, or set on its way. */
  private take(event: Stripe.Event): void {
    const { state, settings, clock } = this.standIn;
    if (!settings.webhookUrl) return;
    event.pending_webhooks = 1;
    if (this.isLost(event)) {
      this.log({ id: '-', eventId: event.id, attempts: 0 }, 'lost', null, 'dropped by the `lose` switch');
      return;
    }
    const { delayMs, shuffle, duplicates } = state.switches;
    this.queue(event.id, 1 + duplicates, clock.flowingMs() + delayMs + (shuffle ? shuffleGatherMs : 0));
  }

  private isLost(event: Stripe.Event): boolean {
    const { lose } = this.standIn.state.switches;
    if (Array.isArray(lose)) return lose.includes(event.type);
    return lose > 0 && this.standIn.weather.next() < lose;
  }

  /** Sends an event again, `times` copies side by side, past delay and loss. */
  redeliver(eventId: string, times: number): void {
    this.queue(eventId, times, this.standIn.clock.flowingMs());
  }

  private queue(eventId: string, copies: number, dueMs: number): void {
    const batch = this.standIn.newId('batch');
    for (let copy = 0; copy < copies; copy += 1) {
      this.standIn.state.deliveries.add({
        id: this.standIn.newId('dlv'),
        eventId,
        attempts: 0,
        dueMs,
        batch,
      });
    }
    this.plan();
  }

  /** Sets the alarm for the next delivery that falls due. Call after anything that may change it. */
  plan(): void {
    clearTimeout(this.timer);
    const { state, clock } = this.standIn;
    if (state.switches.paused || this.stopping.signal.aborted || state.deliveries.size === 0) return;
    const nextMs = Math.min(...state.deliveries.oldestFirst().map((delivery) => delivery.dueMs));
    const waitMs = Math.min(Math.max(0, nextMs - clock.flowingMs()), 60_000);
    this.timer = setTimeout(() => void this.inTurn(() => this.pass(false)), waitMs);
    this.timer.unref();
  }

  /** One attempt for all that waits, now, even where sending is paused; resolves when all have an answer. */
  flush(): Promise<FlushResult> {
    return this.inTurn(() => this.pass(true));
  }

  /** Breaks off what is under way; it stays queued for the next start. */
  async stop(): Promise<void> {
    this.stopping.abort();
    clearTimeout(this.timer);
    await this.work;
  }

  private inTurn<T>(task: () => Promise<T>): Promise<T> {
    const result = this.work.then(task);
    this.work = result.catch(() => {});
    return result;
  }

  private async pass(isForced: boolean): Promise<FlushResult> {
    const { state, clock } = this.standIn;
    const due = state.deliveries
      .oldestFirst()
      .filter((delivery) => isForced || delivery.dueMs <= clock.flowingMs())
      .sort((a, b) => a.dueMs - b.dueMs);
    const result: FlushResult = { attempted: 0, delivered: 0, stillWaiting: 0 };
    for (const group of this.groups(due)) {
      if (this.stopping.signal.aborted || (state.switches.paused && !isForced)) break;
      const outcomes = await Promise.all(group.map((delivery) => this.attempt(delivery)));
      result.attempted += outcomes.length;
      result.delivered += outcomes.filter((isDelivered) => isDelivered).length;
      this.standIn.save();
    }
    result.stillWaiting = state.deliveries.size;
    this.plan();
    return result;
  }

  private groups(due: readonly Delivery[]): Delivery[][] {
    if (this.standIn.state.switches.shuffle) return due.length ? [this.standIn.weather.shuffled(due)] : [];
    const batches = new Map<string, Delivery[]>();
    for (const delivery of due)
      batches.set(delivery.batch, [...(batches.get(delivery.batch) ?? []), delivery]);
    return [...batches.values()];
  }

  private async attempt(delivery: Delivery): Promise<boolean> {
    const { state, settings, clock } = this.standIn;
    const event = state.events.find(delivery.eventId);
    if (!event || !settings.webhookUrl) {
      state.deliveries.remove(delivery.id);
      return false;
    }
    const answer = await postEvent(event, settings.webhookUrl, settings, this.stopping.signal);
    if (this.stopping.signal.aborted && !answer.isTaken) return false;
    delivery.attempts += 1;
    if (answer.isTaken) {
      state.deliveries.remove(delivery.id);
      event.pending_webhooks = 0;
      this.log(delivery, 'delivered', answer.status, null);
      return true;
    }
    const waitSeconds = settings.webhookRetrySeconds[delivery.attempts - 1];
    if (waitSeconds === undefined) state.deliveries.remove(delivery.id);
    else delivery.dueMs = clock.flowingMs() + waitSeconds * 1000 * settings.webhookTimeScale;
    this.log(delivery, waitSeconds === undefined ? 'given-up' : 'failed', answer.status, answer.fault);
    return false;
  }

  private log(
    delivery: Pick<Delivery, 'id' | 'eventId' | 'attempts'>,
    outcome: DeliveryAttempt['outcome'],
    status: number | null,
    detail: string | null,
  ): void {
    const { state, clock } = this.standIn;
    state.attempts.push({
      deliveryId: delivery.id,
      eventId: delivery.eventId,
      type: state.events.find(delivery.eventId)?.type ?? '',
      attempt: delivery.attempts,
      atMs: clock.flowingMs(),
      outcome,
      status,
      detail,
    });
    if (state.attempts.length > keptAttempts) state.attempts.splice(0, state.attempts.length - keptAttempts);
  }
}
