/**
 * A demo whose making was broken off. Its people join the shop as the very last step, so a shop that nobody belongs to is one that
 * was not finished: nobody can have signed in to it or changed anything, and it is removed whole rather than gone on with.
 */
import { eq, inArray, isNull, sql } from "drizzle-orm";
import { getTableConfig, type MySqlTable } from "drizzle-orm/mysql-core";
import type { Database } from "@/db/client";
import * as schema from "@/db/schema";
import type { ShopId } from "@/db/shop-id";
import { storage } from "@/lib/server/storage";
import { demoPeople } from "./people";

/** Removes every shop that nobody belongs to, with its rows and files. Answers how many there were. */
export async function removeUnfinished(db: Database): Promise<number> {
  const { shop, membership, user } = schema;
  const found = await db
    .select({ id: shop.id })
    .from(shop)
    .leftJoin(membership, eq(membership.shopId, shop.id))
    .where(isNull(membership.userId));
  for (const { id } of found) {
    await db.transaction(async (tx) => {
      for (const table of tablesOfShops()) await tx.execute(sql`delete from ${table} where shop_id = ${id}`);
      await tx.delete(shop).where(eq(shop.id, id));
      await tx.delete(user).where(
        inArray(
          user.email,
          demoPeople.map(({ email }) => email),
        ),
      );
    });
    await removeFiles(id);
  }
  return found.length;
}

async function removeFiles(shopId: ShopId): Promise<void> {
  await storage().removePrefix(`shops/${shopId}`);
}

/** All tables with a column shop_id, each before those it refers to. */
export function tablesOfShops(): MySqlTable[] {
  const tables: MySqlTable[] = Object.values(schema);
  const owned = tables.filter((table) => getTableConfig(table).columns.some(({ name }) => name === "shop_id"));
  const ordered: MySqlTable[] = [];
  const visit = (table: MySqlTable): void => {
    if (ordered.includes(table)) return;
    for (const other of owned) if (other !== table && refersTo(other, table)) visit(other);
    ordered.push(table);
  };
  for (const table of owned) visit(table);
  return ordered;
}

function refersTo(from: MySqlTable, to: MySqlTable): boolean {
  return getTableConfig(from).foreignKeys.some((key) => key.reference().foreignTable === to);
}
