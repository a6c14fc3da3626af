/**
 * The id that scopes every query to a shop. The brand is private to this file and nothing here makes one from a string: the only
 * source of a `ShopId` is a row of the database, read by the session gate (the member's shop) or by a task (the shop it was queued for).
 */
declare const shopIdBrand: unique symbol;

export type ShopId = string & { readonly [shopIdBrand]: true };
