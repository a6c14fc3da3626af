/** Boards of the rack, their readings, and what holds them. */
import "server-only";
import { and, asc, count, desc, eq, exists, gte, inArray, like, max, not, or, type SQL, sql } from "drizzle-orm";
import { alias } from "drizzle-orm/mysql-core";
import { v7 as newId } from "uuid";
import { um } from "@/lib/layout";
import type { BoardQuery, boardSorts } from "@/lib/schemas/board";
import { readTag } from "@/lib/schemas/tag";
import type { Connection } from "../client";
import {
  blankMember,
  board,
  boardPicture,
  face,
  job,
  layout,
  layoutBoard,
  moistureReading,
  straightening,
  user,
} from "../schema";
import type { ShopId } from "../shop-id";

export type BoardFields = Omit<
  typeof board.$inferInsert,
  "id" | "shopId" | "tagNumber" | "revision" | "createdAt" | "updatedAt" | "moistureTenths"
>;

/** The blank that a board is to be glued into. */
const intoBlank = alias(board, "into_blank");

const withPicture = {
  board,
  straighteningId: straightening.id,
  backStraighteningId: boardPicture.backStraighteningId,
  levels: straightening.levels,
  inBlankId: intoBlank.id,
  inBlankTagNumber: intoBlank.tagNumber,
};
export type BoardWithPicture = {
  readonly board: typeof board.$inferSelect;
  readonly straighteningId: string | null;
  readonly backStraighteningId: string | null;
  readonly levels: typeof straightening.$inferSelect.levels | null;
  readonly inBlankId: string | null;
  readonly inBlankTagNumber: number | null;
};

/** The column each order of the rack goes by, with the index that holds it in that order. */
const sorts = {
  tag: { column: board.tagNumber, index: "board_tag" },
  species: { column: board.species, index: "board_species" },
  length: { column: board.length, index: "board_length" },
  width: { column: board.width, index: "board_width" },
  thickness: { column: board.thickness, index: "board_thickness" },
  moisture: { column: board.moistureTenths, index: "board_moisture" },
  place: { column: board.place, index: "board_place" },
  newest: { column: board.createdAt, index: "board_created" },
} as const satisfies Record<(typeof boardSorts)[number], unknown>;

/** One page, read in the order of the sort's own index so that no other board is touched. "newest" up begins with the newest. */
export async function listBoards(db: Connection, shopId: ShopId, query: BoardQuery): Promise<BoardWithPicture[]> {
  return boardPageOf(db, shopId, query);
}

/** The statement of `listBoards`, also for asking the database how it goes about it. */
export function boardPageOf(db: Connection, shopId: ShopId, query: BoardQuery) {
  const { column, index } = sorts[query.sort];
  const falling = (query.direction === "down") !== (query.sort === "newest");
  const towards = falling ? desc : asc;
  return (
    db
      .select(withPicture)
      .from(board, { forceIndex: [index] })
      .leftJoin(boardPicture, eq(boardPicture.boardId, board.id))
      .leftJoin(straightening, eq(straightening.id, boardPicture.straighteningId))
      .leftJoin(blankMember, eq(blankMember.boardId, board.id))
      .leftJoin(intoBlank, eq(intoBlank.id, blankMember.blankId))
      .where(matching(db, shopId, query))
      // A tag has no equal; elsewhere the id breaks ties. The unique index would not serve an order that names the id as well.
      .orderBy(...(query.sort === "tag" ? [towards(column)] : [towards(column), towards(board.id)]))
      .limit(query.pageSize)
      .offset((query.page - 1) * query.pageSize)
  );
}

/** How many boards the query finds in all, and the longest of them in µm; 0 when there is none. */
export async function sumUpBoards(db: Connection, shopId: ShopId, query: BoardQuery) {
  const [row] = await db
    .select({ total: count(), longest: max(board.length) })
    .from(board)
    .where(matching(db, shopId, query));
  return { total: row?.total ?? 0, longest: row?.longest ?? null };
}

/** Every species the shop has or had, for filters and for typing ahead. */
export async function listSpecies(db: Connection, shopId: ShopId): Promise<string[]> {
  const rows = await db
    .selectDistinct({ species: board.species })
    .from(board)
    .where(eq(board.shopId, shopId))
    .orderBy(asc(board.species));
  return rows.map(({ species }) => species);
}

const escapeLike = (text: string) => text.replace(/[\\%_]/g, "\\$&");

function matching(db: Connection, shopId: ShopId, query: BoardQuery): SQL | undefined {
  return and(
    eq(board.shopId, shopId),
    query.state === "all" ? undefined : eq(board.state, query.state),
    query.species === "" ? undefined : eq(board.species, query.species),
    query.cut === "" ? undefined : eq(board.cut, query.cut),
    query.minLengthUm === 0 ? undefined : gte(board.length, um(query.minLengthUm)),
    query.minWidthUm === 0 ? undefined : gte(board.width, um(query.minWidthUm)),
    query.minThicknessUm === 0 ? undefined : gte(board.thickness, um(query.minThicknessUm)),
    query.free === "all" ? undefined : holding(db, query.free),
    found(query.search),
  );
}

function found(search: string): SQL | undefined {
  if (search === "") return undefined;
  const pattern = `%${escapeLike(search)}%`;
  const tagNumber = readTag(search);
  return or(
    like(board.species, pattern),
    like(board.place, pattern),
    like(board.source, pattern),
    tagNumber === null ? undefined : eq(board.tagNumber, tagNumber),
  );
}

function holding(db: Connection, free: "yes" | "no"): SQL {
  const held = exists(
    db
      .select({ id: layoutBoard.layoutId })
      .from(layoutBoard)
      .innerJoin(layout, eq(layout.id, layoutBoard.layoutId))
      .innerJoin(face, eq(face.id, layout.faceId))
      .innerJoin(job, eq(job.id, face.jobId))
      .where(and(eq(layoutBoard.boardId, board.id), eq(job.state, "open"))),
  );
  if (free === "no") return held;
  const inBlank = exists(db.select({ id: blankMember.blankId }).from(blankMember).where(eq(blankMember.boardId, board.id)));
  return not(or(held, inBlank) ?? held);
}

/** The faces of open jobs that each of these boards lies on the table of. */
export async function listBoardHolds(db: Connection, shopId: ShopId, boardIds: readonly string[]) {
  if (boardIds.length === 0) return [];
  return db
    .select({ boardId: layoutBoard.boardId, faceId: face.id, faceTitle: face.title, jobId: job.id, jobTitle: job.title })
    .from(layoutBoard)
    .innerJoin(layout, eq(layout.id, layoutBoard.layoutId))
    .innerJoin(face, eq(face.id, layout.faceId))
    .innerJoin(job, eq(job.id, face.jobId))
    .where(and(eq(layoutBoard.shopId, shopId), inArray(layoutBoard.boardId, [...boardIds]), eq(job.state, "open")))
    .orderBy(asc(job.number), asc(face.position), asc(face.id));
}

export async function findBoard(db: Connection, shopId: ShopId, boardId: string): Promise<BoardWithPicture | undefined> {
  const [row] = await db
    .select(withPicture)
    .from(board)
    .leftJoin(boardPicture, eq(boardPicture.boardId, board.id))
    .leftJoin(straightening, eq(straightening.id, boardPicture.straighteningId))
    .leftJoin(blankMember, eq(blankMember.boardId, board.id))
    .leftJoin(intoBlank, eq(intoBlank.id, blankMember.blankId))
    .where(and(eq(board.shopId, shopId), eq(board.id, boardId)));
  return row;
}

/** The board's row, locked until the transaction ends: versions of its picture and readings follow one another. */
export async function lockBoard(tx: Connection, shopId: ShopId, boardId: string) {
  const [row] = await tx
    .select()
    .from(board)
    .where(and(eq(board.shopId, shopId), eq(board.id, boardId)))
    .for("update");
  return row;
}

export async function insertBoard(
  tx: Connection,
  shopId: ShopId,
  tagNumber: number,
  fields: BoardFields,
  at: Date,
): Promise<string> {
  const id = newId();
  await tx.insert(board).values({ ...fields, id, shopId, tagNumber, revision: 1, createdAt: at, updatedAt: at });
  return id;
}

/** Saves from a base revision; false when somebody saved in between. */
export async function updateBoard(
  tx: Connection,
  shopId: ShopId,
  boardId: string,
  baseRevision: number,
  fields: Partial<BoardFields>,
  at: Date,
): Promise<boolean> {
  const [result] = await tx
    .update(board)
    .set({ ...fields, revision: baseRevision + 1, updatedAt: at })
    .where(and(eq(board.shopId, shopId), eq(board.id, boardId), eq(board.revision, baseRevision)));
  return result.affectedRows === 1;
}

export async function setBoardKind(tx: Connection, shopId: ShopId, boardId: string, kind: BoardFields["kind"], at: Date) {
  await tx
    .update(board)
    .set({ kind, updatedAt: at })
    .where(and(eq(board.shopId, shopId), eq(board.id, boardId)));
}

export async function setBoardState(tx: Connection, shopId: ShopId, boardId: string, state: BoardFields["state"], at: Date) {
  await tx
    .update(board)
    .set({ state, revision: sql`${board.revision} + 1`, updatedAt: at })
    .where(and(eq(board.shopId, shopId), eq(board.id, boardId)));
}

export async function insertReading(
  tx: Connection,
  shopId: ShopId,
  boardId: string,
  reading: { tenths: number; takenOn: string; takenBy: string },
  at: Date,
) {
  await tx.insert(moistureReading).values({ ...reading, id: newId(), shopId, boardId, createdAt: at });
}

/** Readings of a board, the latest first. */
export async function listReadings(db: Connection, shopId: ShopId, boardId: string) {
  return db
    .select({
      id: moistureReading.id,
      tenths: moistureReading.tenths,
      takenOn: moistureReading.takenOn,
      takenBy: user.name,
    })
    .from(moistureReading)
    .innerJoin(user, eq(user.id, moistureReading.takenBy))
    .where(and(eq(moistureReading.shopId, shopId), eq(moistureReading.boardId, boardId)))
    .orderBy(desc(moistureReading.takenOn), desc(moistureReading.createdAt), desc(moistureReading.id));
}

/** Writes the latest reading into the board's own row, which the rack sorts by. */
export async function refreshMoisture(tx: Connection, shopId: ShopId, boardId: string, at: Date) {
  const [latest] = await listReadings(tx, shopId, boardId);
  await tx
    .update(board)
    .set({ moistureTenths: latest?.tenths ?? null, updatedAt: at })
    .where(and(eq(board.shopId, shopId), eq(board.id, boardId)));
}
