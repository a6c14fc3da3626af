import mysql from "mysql2/promise";
import { expect, test } from "vitest";

const url = process.env.DATABASE_URL;
if (!url) throw new Error("DATABASE_URL is not set. Run with: node scripts/run.mjs test --only api tests/ground/database");
const { hostname, port } = new URL(url);

test.each(["root", "", "mysql", "mariadb.sys"])("nobody gets in without a password as %j", async (user) => {
  const attempt = mysql.createConnection({ host: hostname, port: Number(port), user });
  await expect(attempt).rejects.toMatchObject({ code: "ER_ACCESS_DENIED_ERROR" });
});

test("the product's user owns its databases and sees no other", async () => {
  const connection = await mysql.createConnection(url);
  try {
    await expect(connection.query("SELECT * FROM mysql.global_priv")).rejects.toMatchObject({ errno: 1142 });
    await expect(connection.query("CREATE DATABASE another")).rejects.toMatchObject({ errno: 1044 });
    const [rows] = await connection.query("SELECT @@character_set_database AS letters, @@time_zone AS zone, DATABASE() AS name");
    expect(rows).toEqual([{ letters: "utf8mb4", zone: "+00:00", name: "grainwright_api" }]);
  } finally {
    await connection.end();
  }
});
