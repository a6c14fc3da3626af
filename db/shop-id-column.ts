/** Whose row it is: the column on every table of a shop's own. */
import { idColumn } from "./columns";
import { shop } from "./schema/shop";
import type { ShopId } from "./shop-id";

export const shopIdColumn = () =>
  idColumn("shop_id")
    .$type<ShopId>()
    .notNull()
    .references(() => shop.id);
