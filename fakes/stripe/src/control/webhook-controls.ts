import { badParameter } from '../api/errors.js';
import type { Fields } from '../api/fields.js';
import type { StandIn } from '../stand-in.js';
import { Random } from '../state/random.js';
import { calmWeather, type WebhookSwitches } from '../state/records.js';
import type { WebhookSender } from '../webhooks/webhook-sender.js';

/** Sets the switches that are named and leaves the others; `reset: true` first calms all of them. */
export function setSwitches(standIn: StandIn, sender: WebhookSender, fields: Fields): object {
  fields.allowOnly('delayMs', 'duplicates', 'shuffle', 'lose', 'paused', 'seed', 'reset', 'url', 'secret');
  const before = fields.boolean('reset') ? calmWeather() : standIn.state.switches;
  const next: WebhookSwitches = {
    delayMs: atLeastZero(fields, 'delayMs') ?? before.delayMs,
    duplicates: atLeastZero(fields, 'duplicates') ?? before.duplicates,
    shuffle: fields.boolean('shuffle') ?? before.shuffle,
    lose: readLoss(fields) ?? before.lose,
    paused: fields.boolean('paused') ?? before.paused,
  };
  const seed = fields.integer('seed');
  standIn.state.switches = next;
  if (seed !== null) standIn.weather.state = new Random(seed).state;
  if (fields.has('url')) standIn.settings.webhookUrl = fields.string('url');
  if (fields.has('secret')) standIn.settings.webhookSecret = fields.requiredString('secret');
  sender.plan();
  return { ...next, url: standIn.settings.webhookUrl };
}

function atLeastZero(fields: Fields, key: string): number | null {
  const value = fields.integer(key);
  if (value !== null && value < 0) throw badParameter(key, `${key} must be 0 or more.`);
  return value;
}

function readLoss(fields: Fields): number | string[] | null {
  if (fields.isNested('lose')) return fields.strings('lose');
  const text = fields.string('lose');
  if (text === null) return null;
  const rate = Number(text);
  if (!(rate >= 0 && rate <= 1))
    throw badParameter('lose', 'lose must be a rate from 0 to 1, or a list of event types.');
  return rate;
}
