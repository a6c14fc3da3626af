import { char, index, int, mysqlTable, uniqueIndex, varchar } from "drizzle-orm/mysql-core";
import { pictureLevelsSchema } from "@/lib/schemas/photo";
import { idColumn, jsonOf, utcColumn } from "../columns";
import { shopIdColumn } from "../shop-id-column";
import { user } from "./user";

/** A photograph as it was taken in. The original is private; only the upright picture without private tags is served. */
export const photo = mysqlTable(
  "photo",
  {
    id: idColumn("id").primaryKey(),
    shopId: shopIdColumn(),
    /** Made by the sender, once a file: a retried upload finds its first try. */
    uploadKey: varchar("upload_key", { length: 64 }).notNull(),
    fileName: varchar("file_name", { length: 255 }).notNull(),
    sha256: char("sha256", { length: 64 }).notNull(),
    kind: varchar("kind", { length: 8, enum: ["jpeg", "png", "webp", "avif", "heic"] }).notNull(),
    bytes: int("bytes").notNull(),
    /** Of the upright picture. */
    widthPx: int("width_px").notNull(),
    heightPx: int("height_px").notNull(),
    takenAt: utcColumn("taken_at"),
    camera: varchar("camera", { length: 120 }),
    /** In hundredths of a millimetre. */
    focalLengthHundredths: int("focal_length_hundredths"),
    /** Storage key of the untouched file. */
    originalKey: varchar("original_key", { length: 200 }).notNull(),
    /** Upright levels: level 0 is the full size. */
    levels: jsonOf(pictureLevelsSchema)("levels").notNull(),
    uploadedBy: idColumn("uploaded_by")
      .notNull()
      .references(() => user.id),
    createdAt: utcColumn("created_at").notNull(),
  },
  (table) => [
    uniqueIndex("photo_upload").on(table.shopId, table.uploadKey),
    // "This photograph is here already": the same file sent again under another key.
    index("photo_sha").on(table.shopId, table.sha256),
    // Photographs taken in and not marked yet, newest first.
    index("photo_recent").on(table.shopId, table.createdAt),
  ],
);
