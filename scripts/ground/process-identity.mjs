// Names a process so that the name stays true after a crash or restart: number and start time, since numbers are used again.
import fs from "node:fs";

/**
 * "number:start" of a running process, or undefined when there is none. The start is counted in clock ticks since boot
 * (field 22 of /proc/PID/stat, proc(5)); a zombie counts as ended.
 * @param {number} pid
 * @returns {string | undefined}
 */
export function identityOf(pid) {
  try {
    const stat = fs.readFileSync(`/proc/${pid}/stat`, "utf8");
    // The second field is the program's name in brackets and may itself hold spaces and brackets.
    const fields = stat.slice(stat.lastIndexOf(")") + 2).split(" ");
    return fields[0] === "Z" ? undefined : `${pid}:${fields[19]}`;
  } catch {
    return undefined;
  }
}

/**
 * Whether the process that once gave this identity is still the one running under that number.
 * @param {string} identity
 */
export function isAlive(identity) {
  return identityOf(Number.parseInt(identity, 10)) === identity;
}

/** The identity of this very process. */
export function ownIdentity() {
  const identity = identityOf(process.pid);
  if (identity === undefined) throw new Error("This process is not listed in /proc; the commands need Linux.");
  return identity;
}
