// The Node.js versions the project runs on. The reasons are the packages': vite 8 wants 20.19 or 22.12 at least.

/** The lowest minor version by major; later majors are all right. */
const lowest = new Map([
  [20, 19],
  [22, 12],
]);

/**
 * @param {string} version as process.versions.node has it
 * @returns {boolean}
 */
export function isNodeSupported(version) {
  const [major = 0, minor = 0] = version.split(".").map(Number);
  return major >= 20 && major !== 21 && minor >= (lowest.get(major) ?? 0);
}
