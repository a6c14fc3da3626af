/** What a PDF says, read by poppler. */
import { execFile } from "node:child_process";
import { mkdtemp, rm, writeFile } from "node:fs/promises";
import { tmpdir } from "node:os";
import path from "node:path";
import { promisify } from "node:util";

const run = promisify(execFile);

export async function readPdf(bytes: Uint8Array): Promise<{ text: string; pages: number }> {
  const folder = await mkdtemp(path.join(tmpdir(), "pdf-"));
  try {
    const file = path.join(folder, "file.pdf");
    await writeFile(file, bytes);
    const { stdout: text } = await run("pdftotext", ["-layout", file, "-"]);
    const { stdout: facts } = await run("pdfinfo", [file]);
    return { text, pages: Number(/^Pages:\s+(\d+)/m.exec(facts)?.[1]) };
  } finally {
    await rm(folder, { recursive: true });
  }
}
