export class SignatureRefused extends Error {}
/** The service could not be reached or asks to be left alone for a while; worth trying again. */
export class PaymentsUnreachable extends Error {}
/** The service refuses the request itself; trying again changes nothing. */
export class PaymentsRefused extends Error {}
/** The bank said no to a charge that the shop asked for; another card may do. */
export class CardDeclined extends PaymentsRefused {}
