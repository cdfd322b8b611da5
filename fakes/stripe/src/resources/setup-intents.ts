import type Stripe from 'stripe';
import type { ApiCall, ApiRoute } from '../api/api-route.js';
import { existing } from '../api/existing.js';
import { createdFilter, pageOf, pageParameters } from '../api/pages.js';
import type { CardBehaviour } from '../payments/card-traits.js';
import type { Cause, StandIn } from '../stand-in.js';
import { emit } from './events.js';

export type SetupDetails = {
  customer: string | null;
  description: string | null;
  metadata: Stripe.Metadata;
};

/** Made together with the page where the card is given. */
export function createSetupIntent(standIn: StandIn, details: SetupDetails, cause: Cause): Stripe.SetupIntent {
  const id = standIn.newId('seti');
  const setup: Stripe.SetupIntent = {
    id,
    object: 'setup_intent',
    allowed_payment_method_types: null,
    application: null,
    automatic_payment_methods: null,
    cancellation_reason: null,
    client_secret: `${id}_secret_${standIn.ids.word(25)}`,
    created: standIn.clock.nowSeconds(),
    customer: details.customer,
    customer_account: null,
    description: details.description,
    excluded_payment_method_types: null,
    flow_directions: null,
    last_setup_error: null,
    latest_attempt: null,
    livemode: false,
    mandate: null,
    metadata: { ...details.metadata },
    next_action: null,
    on_behalf_of: null,
    payment_method: null,
    payment_method_configuration_details: null,
    payment_method_options: { card: { mandate_options: null, network: null, request_three_d_secure: null } },
    payment_method_types: ['card'],
    single_use_mandate: null,
    status: 'requires_payment_method',
    usage: 'off_session',
  };
  standIn.state.setupIntents.add(setup);
  emit(standIn, 'setup_intent.created', setup, cause);
  return setup;
}

export function readySetup(
  standIn: StandIn,
  setup: Stripe.SetupIntent,
  { method, behaviour, url }: { method: Stripe.PaymentMethod; behaviour: CardBehaviour; url: string },
): 'second-step' | 'ready' {
  setup.payment_method = method.id;
  setup.last_setup_error = null;
  if (behaviour.kind !== 'second-step') return 'ready';
  setup.status = 'requires_action';
  setup.next_action = {
    type: 'redirect_to_url',
    redirect_to_url: { url: `${url}/second-step`, return_url: url },
  };
  emit(standIn, 'setup_intent.requires_action', setup, null);
  return 'second-step';
}

export function succeedSetup(standIn: StandIn, setup: Stripe.SetupIntent): void {
  setup.status = 'succeeded';
  setup.next_action = null;
  emit(standIn, 'setup_intent.succeeded', setup, null);
}

export function failSetup(
  standIn: StandIn,
  setup: Stripe.SetupIntent,
  error: Omit<Stripe.SetupIntent.LastSetupError, 'type'>,
): void {
  setup.status = 'requires_payment_method';
  setup.next_action = null;
  setup.payment_method = null;
  setup.last_setup_error = { type: 'card_error', ...error };
  emit(standIn, 'setup_intent.setup_failed', setup, null);
}

export function cancelSetup(standIn: StandIn, setup: Stripe.SetupIntent, cause: Cause): void {
  setup.status = 'canceled';
  setup.next_action = null;
  setup.cancellation_reason = 'abandoned';
  emit(standIn, 'setup_intent.canceled', setup, cause);
}

function listFromCall(call: ApiCall): object {
  call.fields.allowOnly(...pageParameters, 'customer', 'payment_method', 'created');
  const customer = call.fields.string('customer');
  const method = call.fields.string('payment_method');
  const setups = call.standIn.state.setupIntents
    .newestFirst()
    .filter((setup) => customer === null || setup.customer === customer)
    .filter((setup) => method === null || setup.payment_method === method)
    .filter(createdFilter(call.fields));
  return pageOf(call, setups);
}

export const setupIntentRoutes: ApiRoute[] = [
  { method: 'get', path: '/v1/setup_intents', run: listFromCall },
  {
    method: 'get',
    path: '/v1/setup_intents/:id',
    run: ({ standIn, id, fields }) => {
      fields.allowOnly('expand', 'client_secret');
      return existing(standIn.state.setupIntents, 'setup_intent', id, 'intent');
    },
  },
];
