import { index, int, mysqlTable, smallint } from "drizzle-orm/mysql-core";
import { climateSchema } from "@/lib/schemas/climate";
import { movementChoicesSchema } from "@/lib/schemas/movement";
import { idColumn, jsonOf, umColumn, utcColumn } from "../columns";
import { shopIdColumn } from "../shop-id-column";
import { face } from "./job";
import { user } from "./user";

/** Where a shop's furniture lives and its limits on gaps. A shop without a row has what the program starts with. */
export const shopMovement = mysqlTable("shop_movement", {
  shopId: shopIdColumn().primaryKey(),
  climate: jsonOf(climateSchema)("climate").notNull(),
  leastGap: umColumn("least_gap_um").notNull(),
  /** By how much board and surround may differ in moisture, tenths of a percent. */
  moistureLimitTenths: smallint("moisture_limit_tenths").notNull(),
  revision: int("revision").notNull(),
});

/**
 * What was chosen for a face's movement: what stands round the fronts, and which wood the boards are. Beside the layout, not in it: it
 * moves no piece and no cut, so it makes no order out of date.
 */
export const faceMovement = mysqlTable(
  "face_movement",
  {
    faceId: idColumn("face_id")
      .primaryKey()
      .references(() => face.id),
    shopId: shopIdColumn(),
    choices: jsonOf(movementChoicesSchema)("choices").notNull(),
    revision: int("revision").notNull(),
    updatedBy: idColumn("updated_by")
      .notNull()
      .references(() => user.id),
    updatedAt: utcColumn("updated_at").notNull(),
  },
  (table) => [index("face_movement_shop").on(table.shopId)],
);
