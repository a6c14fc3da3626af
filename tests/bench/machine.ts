/** What the numbers were measured on. */
import fs from "node:fs";
import { createRequire } from "node:module";
import os from "node:os";
import sharp from "sharp";

export interface Machine {
  readonly cpu: string;
  readonly cores: number;
  readonly memoryGb: number;
  readonly system: string;
  /** Processes that want to run, over the last minute: more than there are cores means that others were at work too. */
  readonly load: number;
}

export function thisMachine(): Machine {
  return {
    cpu: os.cpus()[0]?.model.trim() ?? "unknown",
    cores: os.availableParallelism(),
    memoryGb: Math.round(os.totalmem() / 1024 ** 3),
    system: `${os.platform()} ${os.arch()} ${os.release()}`,
    load: Math.round((os.loadavg()[0] ?? 0) * 10) / 10,
  };
}

/** Of what takes part in the measuring. */
export function versions(): Readonly<Record<string, string>> {
  const find = createRequire(`${process.cwd()}/package.json`);
  const versionOf = (name: string): string =>
    JSON.parse(fs.readFileSync(find.resolve(`${name}/package.json`, { paths: [process.cwd()] }), "utf8")).version;
  return {
    node: process.versions.node,
    sharp: sharp.versions.sharp ?? versionOf("sharp"),
    libvips: sharp.versions.vips,
    "@techstark/opencv-js": versionOf("@techstark/opencv-js"),
    next: versionOf("next"),
  };
}
